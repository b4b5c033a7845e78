import type { ConvergenceChart } from "@/app/components/charts/convergence-spec";
import { nodesPerAxisOf, scalesOf } from "@/app/components/charts/chart-frame";
import type { Curve } from "@/app/components/charts/curve";
import { formatTolerance } from "@/app/components/ui/figures";
import { curvePoints } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { RelativeNormName, Study } from "@/benchmarks/scoring/result";
import type { MethodFamily } from "@/drizzle/enums";

const normNames: Record<RelativeNormName, string> = { relL1: "L1", relL2: "L2", relMax: "max" };

const samples = 120;

/** The refinement lines of one submission: they differ by weight and by their direct labels, never by dash. */
export function studyChartOf(
  studies: Study[],
  family: MethodFamily,
  outputTime: number | null,
): ConvergenceChart {
  const atNodes = studies.filter((study) => study.measure === "nodes");
  const curves = atNodes.map((study) => curveOf(study, family, atNodes.length > 1));
  const when = outputTime === null ? "" : `, t = ${Number(outputTime.toPrecision(6))}`;
  const norm = curves.length === 1 ? `relative ${normNames[atNodes[0].norm]} error` : "relative error";
  return {
    scales: scalesOf(
      curves.flatMap((curve) => curve.points),
      null,
    ),
    curves,
    tolerance: null,
    slope: slopeOf(atNodes.find((study) => study.norm === "relL2")),
    titles: { x: "N, nodes per axis", y: `${norm} at the nodes${when}` },
  };
}

function curveOf(study: Study, family: MethodFamily, isLabelled: boolean): Curve {
  const name = normNames[study.norm];
  const isHeadline = study.norm === "relL2";
  return {
    id: study.norm,
    label: isLabelled ? name : null,
    shortLabel: isLabelled ? name : null,
    name: `relative ${name} error`,
    family,
    points: study.points.map(({ n, error }) => ({ nodesPerAxis: nodesPerAxisOf(n), error })),
    line: curvePoints(study, samples),
    weight: isHeadline ? "strong" : "thin",
    hasMarks: isHeadline,
  };
}

/** A line of the observed order below the finer half of the study. */
function slopeOf(study: Study | undefined): ConvergenceChart["slope"] {
  if (study?.kind !== "algebraic" || study.order === null || study.points.length < 3) return null;
  const from = study.points[Math.floor(study.points.length / 2) - 1];
  const to = study.points[study.points.length - 1];
  return {
    order: Math.round(study.order * 100) / 100,
    from: { n: nodesPerAxisOf(from.n), error: from.error / 3 },
    toNodes: nodesPerAxisOf(to.n),
  };
}

/** The chart in words. */
export function studyChartLabel(studies: Study[]): string {
  const study = studies.find(({ norm, measure }) => norm === "relL2" && measure === "nodes");
  const [first, last] = [study?.points[0], study?.points.at(-1)];
  if (!study || !first || !last) return "No error to draw yet";
  const spoken = (error: number) => formatTolerance(Number(error.toPrecision(2)));
  return `Relative L2 error from ${spoken(first.error)} at N = ${first.n.join(" × ")} to ${spoken(last.error)} at N = ${last.n.join(" × ")}`;
}
