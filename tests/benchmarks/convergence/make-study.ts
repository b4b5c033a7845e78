import type { ReadableStudy } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { StudyPoint } from "@/benchmarks/scoring/result";

/** A point of a 1-D periodic study: as many intervals as nodes. */
export function pointOf(n: number, error: number, extra: Partial<StudyPoint> = {}): StudyPoint {
  return {
    n: [n],
    nodes: n,
    intervals: n,
    axisIntervals: [n],
    error,
    unknowns: n,
    wallSeconds: null,
    ...extra,
  };
}

/** A study of 1-D periodic runs from [n, error] pairs. */
export function studyOf(pairs: [number, number][], tail: ReadableStudy["tail"] = null): ReadableStudy {
  return { points: pairs.map(([n, error]) => pointOf(n, error)), tail };
}
