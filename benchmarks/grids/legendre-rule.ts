/** Gauss-Legendre and Gauss-Lobatto-Legendre nodes and weights by Newton iteration. */

/** Nodes ascending on [-1, 1] with their weights, which sum to 2. */
export interface LegendreRule {
  nodes: Float64Array;
  weights: Float64Array;
}

/** 2^27 + 1 splits a double into two halves whose products are exact (Dekker 1971). */
const splitter = 134217729;

/** k/(k+1) for k = 0..n-1, each as an unevaluated sum of two doubles. */
function recurrenceRatios(n: number): { high: Float64Array; low: Float64Array } {
  const high = new Float64Array(n);
  const low = new Float64Array(n);
  for (let k = 0; k < n; k++) {
    const ratio = k / (k + 1);
    const scaled = splitter * ratio;
    const upper = scaled - (scaled - ratio);
    // k + 1 has few bits, so both partial products are exact.
    const remainder = k - upper * (k + 1) - (ratio - upper) * (k + 1);
    high[k] = ratio;
    low[k] = remainder / (k + 1);
  }
  return { high, low };
}

/** P_n and P_(n-1) at xh + xl in doubled precision, into `out` as [high, low, high, low]. */
function legendrePair(
  n: number,
  xh: number,
  xl: number,
  ratios: { high: Float64Array; low: Float64Array },
  out: Float64Array,
): void {
  const { high, low } = ratios;
  let scaled = splitter * xh;
  const x1 = scaled - (scaled - xh);
  const x2 = xh - x1;
  let ah = 1;
  let al = 0;
  let bh = xh;
  let bl = xl;
  for (let k = 1; k < n; k++) {
    // t = x * P_k
    let product = xh * bh;
    scaled = splitter * bh;
    let upper = scaled - (scaled - bh);
    let lower = bh - upper;
    let rest = x1 * upper - product + x1 * lower + x2 * upper + x2 * lower + xh * bl + xl * bh;
    const th = product + rest;
    const tl = rest - (th - product);
    // d = t - P_(k-1)
    let sum = th - ah;
    let shift = sum - th;
    rest = th - (sum - shift) + (-ah - shift) + tl - al;
    const dh = sum + rest;
    const dl = rest - (dh - sum);
    // m = d * k/(k+1)
    const rh = high[k];
    product = rh * dh;
    scaled = splitter * dh;
    upper = scaled - (scaled - dh);
    lower = dh - upper;
    scaled = splitter * rh;
    const r1 = scaled - (scaled - rh);
    const r2 = rh - r1;
    rest = r1 * upper - product + r1 * lower + r2 * upper + r2 * lower + rh * dl + low[k] * dh;
    const mh = product + rest;
    const ml = rest - (mh - product);
    // P_(k+1) = t + m
    ah = bh;
    al = bl;
    sum = th + mh;
    shift = sum - th;
    rest = th - (sum - shift) + (mh - shift) + tl + ml;
    bh = sum + rest;
    bl = rest - (bh - sum);
  }
  out[0] = bh;
  out[1] = bl;
  out[2] = ah;
  out[3] = al;
}

/** P_n and P_(n-1) at x in double precision, into `out`. */
function legendrePairQuick(n: number, x: number, out: Float64Array): void {
  let before = 1;
  let value = x;
  for (let k = 1; k < n; k++) {
    const next = x * value + (k / (k + 1)) * (x * value - before);
    before = value;
    value = next;
  }
  out[0] = value;
  out[1] = before;
}

/** x*P_n - P_(n-1), which is (x^2 - 1) P_n'/n, from doubled values and rounded to double at the end. */
function scaledSlope(x: number, pair: Float64Array): number {
  const product = x * pair[0];
  let scaled = splitter * x;
  const x1 = scaled - (scaled - x);
  const x2 = x - x1;
  scaled = splitter * pair[0];
  const p1 = scaled - (scaled - pair[0]);
  const p2 = pair[0] - p1;
  const low = x1 * p1 - product + x1 * p2 + x2 * p1 + x2 * p2 + x * pair[1] - pair[3];
  const sum = product - pair[2];
  const shift = sum - product;
  return sum + (product - (sum - shift) + (-pair[2] - shift) + low);
}

function checkCount(name: string, n: number, least: number): void {
  if (!Number.isInteger(n) || n < least) {
    throw new RangeError(`${name} needs a whole number of nodes from ${least} on, not ${n}`);
  }
}

/**
 * The n-point Gauss-Legendre rule on [-1, 1], exact for polynomials of degree 2n - 1.
 *
 * Newton iteration in double precision, finished by one step whose residual and derivative come from a recurrence
 * in doubled precision: nodes and weights are accurate to 2 ulp up to n = 4096. Cost O(n^2).
 *
 * @param n number of nodes, 1 or more
 * @returns nodes ascending, weights (no unit), both of length n
 * @throws RangeError where n is not a whole number from 1 on
 * @example gaussLegendre(2).nodes // [-0.577..., 0.577...]
 * @see Abramowitz and Stegun 1964, 25.4.29; Press et al. 2007, section 4.6
 */
export function gaussLegendre(n: number): LegendreRule {
  checkCount("Gauss-Legendre", n, 1);
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  const ratios = recurrenceRatios(n);
  const pair = new Float64Array(4);
  for (let i = 0; i < n >> 1; i++) {
    let x = (1 - 1 / (8 * n * n) + 1 / (8 * n ** 3)) * Math.cos((Math.PI * (4 * i + 3)) / (4 * n + 2));
    for (let step = 0; step < 12; step++) {
      legendrePairQuick(n, x, pair);
      const change = (pair[0] * (1 - x) * (1 + x)) / (n * (pair[1] - x * pair[0]));
      x -= change;
      if (Math.abs(change) < 1e-14) break;
    }
    legendrePair(n, x, 0, ratios, pair);
    const square = (1 - x) * (1 + x);
    const slope = (-n * scaledSlope(x, pair)) / square;
    const change = pair[0] / slope;
    // The derivative and 1 - x^2 at the corrected node, to first order in the correction.
    const slopeThere = slope - (change * (2 * x * slope - n * (n + 1) * pair[0])) / square;
    const squareThere = square + 2 * x * change - change * change;
    nodes[n - 1 - i] = x - change;
    nodes[i] = -nodes[n - 1 - i];
    weights[i] = weights[n - 1 - i] = 2 / (squareThere * slopeThere * slopeThere);
  }
  if (n % 2 === 1) {
    legendrePair(n, 0, 0, ratios, pair);
    const slope = n * (pair[2] + pair[3]);
    weights[n >> 1] = 2 / (slope * slope);
  }
  return { nodes, weights };
}

/**
 * The n-point Gauss-Lobatto-Legendre rule on [-1, 1], which holds both ends; exact to degree 2n - 3.
 *
 * The inner nodes are the zeros of P'_(n-1); the weights are 2 / (n (n-1) P_(n-1)^2).
 *
 * @param n number of nodes, 2 or more
 * @returns nodes ascending, weights (no unit), both of length n
 * @throws RangeError where n is not a whole number from 2 on
 * @example gaussLobatto(3).weights // [1/3, 4/3, 1/3]
 * @see Abramowitz and Stegun 1964, 25.4.32; starting values of Parter 1999
 */
export function gaussLobatto(n: number): LegendreRule {
  checkCount("Gauss-Lobatto", n, 2);
  const degree = n - 1;
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  const ratios = recurrenceRatios(n);
  const pair = new Float64Array(4);
  const scale = degree * (degree + 1);
  nodes[0] = -1;
  nodes[degree] = 1;
  weights[0] = weights[degree] = 2 / scale;
  for (let i = 1; i <= degree >> 1; i++) {
    if (2 * i === degree) {
      legendrePair(degree, 0, 0, ratios, pair);
      weights[i] = 2 / (scale * pair[0] * pair[0]);
      break;
    }
    const shift = i + 0.25;
    let x = Math.cos((Math.PI * shift) / degree - 3 / (8 * degree * Math.PI * shift));
    for (let step = 0; step < 12; step++) {
      legendrePairQuick(degree, x, pair);
      const square = (1 - x) * (1 + x);
      const slope = (degree * (pair[1] - x * pair[0])) / square;
      const change = (slope * square) / (2 * x * slope - scale * pair[0]);
      x -= change;
      if (Math.abs(change) < 1e-14) break;
    }
    legendrePair(degree, x, 0, ratios, pair);
    const square = (1 - x) * (1 + x);
    const slope = (-degree * scaledSlope(x, pair)) / square;
    const change = (slope * square) / (2 * x * slope - scale * pair[0]);
    const value = pair[0] - change * slope;
    nodes[degree - i] = x - change;
    nodes[i] = -nodes[degree - i];
    weights[i] = weights[degree - i] = 2 / (scale * value * value);
  }
  return { nodes, weights };
}
