import { useMemo } from "react";
import { Chart } from "@/app/components/charts/chart";
import type { Drawings } from "@/app/components/charts/drawings";
import { chartOfStudies } from "@/app/components/record/record-chart";
import { formatError, formatNodes } from "@/app/components/ui/figures";
import type { Study } from "@/benchmarks/scoring/result";
import type { MethodFamily } from "@/drizzle/enums";

interface StudyChartProps {
  studies: Study[];
  family: MethodFamily;
  outputTime: number | null;
  /** Left out where the figures come to exist in the browser only. */
  drawings?: Drawings;
}

const undrawn: Drawings = { wide: "", narrow: "" };

/** Error over nodes; the figures stand in the table beside it. */
export function StudyChart({ studies, family, outputTime, drawings = undrawn }: StudyChartProps) {
  const chart = useMemo(
    () => chartOfStudies(studies, family, outputTime, null),
    [studies, family, outputTime],
  );
  return <Chart chart={chart} drawings={drawings} label={labelOf(studies)} layout="record" />;
}

/** The chart in words. */
function labelOf(studies: Study[]): string {
  const study = studies.find(({ norm, measure }) => norm === "relL2" && measure === "nodes");
  const [first, last] = [study?.points.at(0), study?.points.at(-1)];
  if (!first || !last) return "No error to draw yet";
  return `Relative L2 error from ${formatError(first.error)} at N = ${formatNodes(first.n)} to ${formatError(last.error)} at N = ${formatNodes(last.n)}; the table beside it holds the figures`;
}
