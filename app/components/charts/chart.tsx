import { lazy, Suspense, useMemo } from "react";
import { type ConvergenceChart, convergenceSpec } from "./convergence-spec";
import { type Drawings, sizes } from "./drawings";
import { useMeasuredPlot } from "./use-measured-plot";

const VegaChart = lazy(() => import("./vega-chart"));

interface ChartProps {
  chart: ConvergenceChart;
  drawings: Drawings;
  /** The text alternative; a table of the plotted points stands beside the chart. */
  label: string;
  layout: keyof typeof sizes;
}

/**
 * The server's drawings first, so that the page is whole before any script; then drawn again at the measured width.
 * The place is the same for both, and nothing moves.
 */
export function Chart({ chart, drawings, label, layout }: ChartProps) {
  const { place, size, isDrawn, onDrawn } = useMeasuredPlot(layout);
  const spec = useMemo(() => (size ? convergenceSpec(chart, size) : null), [chart, size]);
  return (
    <div ref={place} className={`chart chart-${layout}`} role="img" aria-label={label}>
      {isDrawn ? null : (
        <>
          <div className="chart-wide" dangerouslySetInnerHTML={{ __html: drawings.wide }} />
          <div className="chart-narrow" dangerouslySetInnerHTML={{ __html: drawings.narrow }} />
        </>
      )}
      {spec ? (
        <div className={isDrawn ? "chart-live" : "chart-live waits"}>
          <Suspense fallback={null}>
            <VegaChart spec={spec} onDrawn={onDrawn} />
          </Suspense>
        </div>
      ) : null}
    </div>
  );
}
