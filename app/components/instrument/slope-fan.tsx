import { type FrameScales } from "@/app/components/charts/chart-frame";
import { sizes } from "@/app/components/charts/drawings";

const orders = [1, 2, 4, 6, 8];

/** How steep the orders are on this chart's paper: one octave of nodes. */
export function SlopeFan({ scales }: { scales: FrameScales }) {
  const { width, height } = sizes.instrument.wide;
  const octave = width / Math.log2(scales.nMax / scales.nMin);
  const decade = height / (scales.topExponent - scales.bottomExponent);
  const reach = Math.min(1, 84 / (8 * Math.log10(2) * decade));
  const across = Math.round(reach * octave);
  const fall = (order: number) => Math.round(10 * reach * order * Math.log10(2) * decade) / 10;
  const labels = spread(orders.slice(1).map((order) => 6 + fall(order)));
  const tall = Math.max(fall(8), labels[labels.length - 1]) + 14;
  return (
    <svg
      className="fan"
      width="140"
      height={tall}
      viewBox={`-3 0 140 ${tall}`}
      role="img"
      aria-label="Slopes of order 1, 2, 4, 6 and 8 at the scale of the chart"
    >
      <path d={`M0 6H${across}`} stroke="var(--ink-3)" strokeDasharray="2 2" />
      {orders.map((order) => (
        <path key={order} d={`M0 6L${across} ${6 + fall(order)}`} stroke="var(--ink)" fill="none" />
      ))}
      {orders.slice(1).map((order, index) => (
        <text key={order} x={across + 6} y={labels[index] + 4} fill="var(--ink-2)" className="c-tick">
          {index === 0 ? `p = ${order}` : order}
        </text>
      ))}
      <circle cx="0" cy="6" r="2.4" fill="var(--ink)" />
    </svg>
  );
}

function spread(places: number[]): number[] {
  return places.reduce<number[]>((done, y) => [...done, Math.max(y, (done.at(-1) ?? -Infinity) + 12)], []);
}
