import { useMemo } from "react";
import { Chart } from "@/app/components/charts/chart";
import type { Drawings } from "@/app/components/charts/drawings";
import type { Study } from "@/benchmarks/scoring/result";
import type { MethodFamily } from "@/drizzle/enums";
import { studyChartLabel, studyChartOf } from "./study-curves";

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
  const chart = useMemo(() => studyChartOf(studies, family, outputTime), [studies, family, outputTime]);
  return <Chart chart={chart} drawings={drawings} label={studyChartLabel(studies)} layout="record" />;
}
