import type { Study } from "@/benchmarks/scoring/result";

/** A study on one periodic axis with the given nodes, errors and declared seconds; its label is left undecided. */
export function studyOf(runs: [nodes: number, error: number, seconds?: number][]): Study {
  return {
    norm: "relL2",
    measure: "nodes",
    points: runs.map(([nodes, error, seconds]) => ({
      n: [nodes],
      nodes,
      intervals: nodes,
      axisIntervals: [nodes],
      error,
      unknowns: nodes,
      wallSeconds: seconds ?? null,
    })),
    pairOrders: [],
    kind: "undecided",
    order: null,
    orderInterval: null,
    rate: null,
    tail: null,
    verdict: "undecidable",
    leadingCoefficient: null,
    marks: [],
    gridConvergence: null,
    ladders: [],
  };
}
