import { nodesPerAxisOf, scalesOf } from "@/app/components/charts/chart-frame";
import type { ConvergenceChart } from "@/app/components/charts/convergence-spec";
import type { Curve } from "@/app/components/charts/curve";
import { normNames } from "@/app/components/instrument/ranking-words";
import { curvePoints, nodesForTolerance } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { Study } from "@/benchmarks/scoring/result";
import type { MethodFamily } from "@/drizzle/enums";

const samples = 96;

/** The norms of one study at the nodes: the headline heavier and marked, a slope beside it, the line where it is read. */
export function chartOfStudies(
  studies: readonly Study[],
  family: MethodFamily,
  outputTime: number | null,
  tolerance: number | null,
): ConvergenceChart {
  const drawn = studies.filter((study) => study.measure === "nodes" && study.points.length > 0);
  const headline = drawn.find((study) => study.norm === "relL2") ?? drawn.at(0);
  const curves = drawn.map((study) => toCurve(study, family, study === headline));
  const time = outputTime === null ? "" : `, t = ${outputTime}`;
  return {
    scales: scalesOf(
      curves.flatMap((curve) => [...curve.points, ...curve.line]),
      tolerance,
    ),
    // The headline lies on top.
    curves: curves.toSorted((a, b) => Number(a.hasMarks) - Number(b.hasMarks)),
    tolerance: tolerance === null ? null : { tolerance, rings: headline ? ringsOf(headline, tolerance) : [] },
    slope: headline ? slopeOf(headline) : null,
    titles: { x: "N, nodes per axis", y: `relative error at the nodes${time}` },
  };
}

function toCurve(study: Study, family: MethodFamily, isHeadline: boolean): Curve {
  const name = normNames[study.norm];
  return {
    id: study.norm,
    label: name,
    shortLabel: name,
    name,
    family,
    points: study.points.map(({ n, error }) => ({ nodesPerAxis: nodesPerAxisOf(n), error })),
    line: curvePoints(study, samples),
    weight: isHeadline ? "strong" : "thin",
    hasMarks: isHeadline,
  };
}

function ringsOf(study: Study, tolerance: number): number[] {
  const reading = nodesForTolerance(study, tolerance);
  return reading.kind === "reached" && !reading.atMost ? [nodesPerAxisOf(reading.n)] : [];
}

/** Below the curve's last algebraic stretch, a third of a decade off. */
function slopeOf({ kind, order, points, tail }: Study): ConvergenceChart["slope"] {
  if (kind !== "algebraic" || order === null || points.length < 3) return null;
  const from = tail ? points.findIndex((point) => point.n.join() === tail.from.join()) : -1;
  const last = from > 0 ? from : points.length - 1;
  const first = Math.max(0, last - 2);
  if (first === last) return null;
  const start = points[first];
  return {
    order,
    from: { n: nodesPerAxisOf(start.n), error: start.error * 10 ** -0.45 },
    toNodes: nodesPerAxisOf(points[last].n),
  };
}
