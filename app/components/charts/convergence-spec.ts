import type { TopLevelSpec } from "vega-lite";
import type { ChartFrame, FrameScales } from "./chart-frame";
import { chartConfig } from "./chart-theme";
import type { Curve } from "./curve";
import { curveLayers, labelLayers, slopeLayers } from "./curve-layers";
import { paperEncoding, paperLayers } from "./paper-layers";
import { toleranceLayers, type ToleranceMarks } from "./tolerance-layers";

export interface ConvergenceChart {
  scales: FrameScales;
  curves: Curve[];
  tolerance: ToleranceMarks | null;
  slope: { order: number; from: { n: number; error: number }; toNodes: number } | null;
  titles: { x: string; y: string };
}

export interface ChartSize {
  width: number;
  height: number;
  /** Room for the names at the curves' ends; without it they give way to the ranks. */
  right: number;
}

/** Room about the plot, the same for every drawing, so that pages can place it. */
export const chartMargin = { left: 64, top: 32, bottom: 48 };

const roomForNames = 100;

/** Log error over log nodes: curves with their marks and names, the tolerance line and its readings. */
export function convergenceSpec(chart: ConvergenceChart, size: ChartSize): TopLevelSpec {
  const frame: ChartFrame = { ...chart.scales, width: size.width, height: size.height };
  return {
    width: size.width,
    height: size.height,
    autosize: { type: "none", contains: "content" },
    padding: { ...chartMargin, right: size.right },
    config: chartConfig,
    encoding: paperEncoding(frame, chart.titles),
    layer: [
      ...paperLayers(frame),
      ...curveLayers(chart.curves),
      ...(chart.slope ? slopeLayers(chart.slope) : []),
      ...(chart.tolerance ? toleranceLayers(chart.tolerance, frame) : []),
      ...labelLayers(chart.curves, frame, size.right < roomForNames),
    ],
    resolve: {
      scale: {
        fill: "independent",
        stroke: "independent",
        strokeWidth: "independent",
        shape: "independent",
        strokeDash: "independent",
      },
    },
  };
}
