import { type ConvergenceChart, convergenceSpec } from "./convergence-spec";
import { type Drawings, sizes } from "./drawings";
import { renderChart } from "./render-chart.server";

/** Both drawings of a chart, for loaders. */
export async function drawChart(chart: ConvergenceChart, layout: keyof typeof sizes): Promise<Drawings> {
  const [wide, narrow] = await Promise.all([
    renderChart(convergenceSpec(chart, sizes[layout].wide)),
    renderChart(convergenceSpec(chart, sizes[layout].narrow)),
  ]);
  return { wide, narrow };
}
