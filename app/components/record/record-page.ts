import type { ConvergenceChart } from "@/app/components/charts/convergence-spec";
import type { Drawings } from "@/app/components/charts/drawings";

/** A study's chart with the server's drawings of it. */
export interface DrawnChart {
  chart: ConvergenceChart;
  drawings: Drawings;
}
