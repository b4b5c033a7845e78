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

/** An unevaluated sum of two doubles, the second far below the first. */
type Double = [high: number, low: number];

function exactSum(a: number, b: number): Double {
  const sum = a + b;
  const shift = sum - a;
  return [sum, a - (sum - shift) + (b - shift)];
}

function exactProduct(a: number, b: number): Double {
  const product = a * b;
  let scaled = splitter * a;
  const a1 = scaled - (scaled - a);
  const a2 = a - a1;
  scaled = splitter * b;
  const b1 = scaled - (scaled - b);
  const b2 = b - b1;
  return [product, a1 * b1 - product + a1 * b2 + a2 * b1 + a2 * b2];
}

function product(a: Double, b: Double): Double {
  const [high, low] = exactProduct(a[0], b[0]);
  return [high, low + a[0] * b[1] + a[1] * b[0]];
}

/** a/b, rounded once or twice. */
function quotient(a: Double, b: Double): number {
  const first = a[0] / b[0];
  const back = exactProduct(first, b[0]);
  return first + (a[0] - back[0] - back[1] + a[1] - first * b[1]) / b[0];
}

/** P_(n-1) - x P_n, which is (1 - x^2) P_n'/n. */
function scaledSlope(x: number, pair: Float64Array): Double {
  const [high, low] = product([x, 0], [pair[0], pair[1]]);
  const [sum, rest] = exactSum(pair[2], -high);
  return [sum, rest + pair[3] - low];
}

/** 1 - x^2 for x = x_0 - change. */
function complement(x0: number, change: number): Double {
  const [x, rest] = exactSum(x0, -change);
  const [below, belowRest] = exactSum(1, -x);
  const [above, aboveRest] = exactSum(1, x);
  return product([below, belowRest - rest], [above, aboveRest + rest]);
}

/** 2 a / (scale b^2), scale a whole number. */
function weightOf(a: Double, b: Double, scale: number): number {
  return quotient([2 * a[0], 2 * a[1]], product([scale, 0], product(b, b)));
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
    const slope = scaledSlope(x, pair);
    const change = (pair[0] * (1 - x) * (1 + x)) / (n * slope[0]);
    nodes[n - 1 - i] = x - change;
    nodes[i] = -nodes[n - 1 - i];
    // (1 - x^2) P_n' is stationary at the node, so that the corrected node needs no new evaluation of it.
    weights[i] = weights[n - 1 - i] = weightOf(complement(x, change), slope, n * n);
  }
  if (n % 2 === 1) {
    legendrePair(n, 0, 0, ratios, pair);
    weights[n >> 1] = weightOf([1, 0], [pair[2], pair[3]], n * n);
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
      weights[i] = weightOf([1, 0], [pair[0], pair[1]], scale);
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
    const slope = (degree * scaledSlope(x, pair)[0]) / square;
    const change = (slope * square) / (2 * x * slope - scale * pair[0]);
    nodes[degree - i] = x - change;
    nodes[i] = -nodes[degree - i];
    // P_(n-1) is stationary at the node.
    weights[i] = weights[degree - i] = weightOf([1, 0], [pair[0], pair[1]], scale);
  }
  return { nodes, weights };
}
