/** The two logarithmic scales of a convergence chart, in pixels; the ranking's tracks use the same ones. */
export interface ChartFrame {
  width: number;
  height: number;
  /** Nodes per axis at the left and right edge. */
  nMin: number;
  nMax: number;
  /** Powers of ten at the upper and lower edge. */
  topExponent: number;
  bottomExponent: number;
}

export type FrameScales = Omit<ChartFrame, "width" | "height">;

export interface FramePoint {
  nodesPerAxis: number;
  error: number;
}

const leastExponent = -17;
const emptyScales: FrameScales = { nMin: 4, nMax: 512, topExponent: 0, bottomExponent: -16 };

/** Scales that hold every point and the tolerance; no point is dropped. */
export function scalesOf(points: readonly FramePoint[], tolerance: number | null): FrameScales {
  const drawn = points.filter(({ nodesPerAxis, error }) => nodesPerAxis > 0 && Number.isFinite(error));
  if (drawn.length === 0) return emptyScales;
  const nodes = drawn.map((point) => point.nodesPerAxis);
  const exponents = drawn.map((point) => exponentOf(point.error));
  const line = tolerance === null ? [] : [Math.log10(tolerance)];
  const smallest = Math.min(...nodes);
  const largest = Math.max(...nodes);
  const topExponent = Math.ceil(Math.max(...exponents, ...line, -1) + 0.08);
  return {
    nMin: 2 ** Math.floor(Math.log2(smallest) - 0.05),
    nMax: Math.max(largest * 1.04, smallest * 4),
    topExponent,
    bottomExponent: Math.min(
      topExponent - 3,
      Math.max(leastExponent, Math.floor(Math.min(...exponents, ...line) - 0.08)),
    ),
  };
}

function exponentOf(error: number): number {
  return Math.max(leastExponent, Math.log10(Math.max(error, 10 ** leastExponent)));
}

/** Place along the nodes scale, from 0 to 1. */
export function nodesShare({ nMin, nMax }: FrameScales, nodesPerAxis: number): number {
  return Math.log(nodesPerAxis / nMin) / Math.log(nMax / nMin);
}

/** Place down the error scale, from 0 at the top to 1. */
export function errorShare({ topExponent, bottomExponent }: FrameScales, error: number): number {
  return (topExponent - exponentOf(error)) / (topExponent - bottomExponent);
}

export function xOf(frame: ChartFrame, nodesPerAxis: number): number {
  return frame.width * nodesShare(frame, nodesPerAxis);
}

export function yOf(frame: ChartFrame, error: number): number {
  return frame.height * errorShare(frame, error);
}

/** Powers of two within the scale. */
export function nodeTicks({ nMin, nMax }: FrameScales): number[] {
  const ticks: number[] = [];
  for (let n = 2 ** Math.ceil(Math.log2(nMin) - 1e-9); n <= nMax * 1.0001; n *= 2) ticks.push(n);
  return ticks;
}

/** As many of the ticks as leave each its room. */
export function labelledTicks(ticks: readonly number[], width: number): number[] {
  const every = Math.max(1, Math.ceil((ticks.length * 40) / Math.max(width, 1)));
  return ticks.filter((_, index) => index % every === 0);
}

export function nodesPerAxisOf(n: readonly number[]): number {
  return n.reduce((product, count) => product * count, 1) ** (1 / n.length);
}

/** Where a drawn curve meets the tolerance, of several places the one nearest to the nodes that were read. */
export function crossingOf(line: readonly FramePoint[], tolerance: number, near: number): number {
  let best = near;
  let distance = Infinity;
  for (let k = 1; k < line.length; k++) {
    const [from, to] = [line[k - 1], line[k]];
    if (!(from.error > tolerance && to.error <= tolerance)) continue;
    const share = Math.log(from.error / tolerance) / Math.log(from.error / Math.max(to.error, 1e-18));
    const at = from.nodesPerAxis * (to.nodesPerAxis / from.nodesPerAxis) ** share;
    const off = Math.abs(Math.log(at / near));
    if (off < distance) [best, distance] = [at, off];
  }
  return best;
}
