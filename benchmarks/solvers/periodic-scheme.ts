import { inverseFourierTransform, modeNumbers } from "../transforms/fourier-transform";
import { centredWeights } from "../interpolation/fornberg-weights";

/** How a discretisation differentiates on a uniform periodic grid, told by what it does to each mode. */
export interface PeriodicScheme {
  /** w(theta): the first derivative of exp(i theta j) is i w(theta)/h times it. */
  first(theta: number): number;
  /** w2(theta): the second derivative of exp(i theta j) is -w2(theta)/h^2 times it. */
  second(theta: number): number;
  /** w3(theta): the third derivative of exp(i theta j) is -i w3(theta)/h^3 times it; null where there is no formula. */
  third: ((theta: number) => number) | null;
  /** Centred weights of an explicit formula; null where every node enters. */
  stencils: { first: Float64Array; second: Float64Array } | null;
}

/**
 * Explicit central differences.
 *
 * @param order 2, 4, 6, ...
 * @throws RangeError where the order is not even
 * @example centralScheme(2).first(Math.PI / 2) // 1
 * @see Fornberg 1988; modified wavenumbers as in Lele 1992, section 3
 */
export function centralScheme(order: number): PeriodicScheme {
  const first = centredWeights(1, order);
  const second = centredWeights(2, order);
  const third = centredWeights(3, order);
  const reach = order / 2;
  return {
    stencils: { first, second },
    third: (theta) => sum(reach + 1, (m) => -2 * third[reach + 1 + m] * Math.sin(m * theta)),
    first: (theta) => sum(reach, (m) => 2 * first[reach + m] * Math.sin(m * theta)),
    // 1 - cos as a squared sine keeps the digits of long waves.
    second: (theta) => sum(reach, (m) => 4 * second[reach + m] * Math.sin((m * theta) / 2) ** 2),
  };
}

/**
 * Tridiagonal compact differences of order 4 and 6.
 *
 * @param order 4 or 6
 * @example compactScheme(4).first(Math.PI / 2) // 1.5
 * @see S. K. Lele, Compact finite difference schemes with spectral-like resolution, J. Comput. Phys. 103 (1992) 16-42,
 *   equations 2.1 and 2.2
 */
export function compactScheme(order: 4 | 6): PeriodicScheme {
  const [alpha, a, b] = order === 4 ? [1 / 4, 3 / 2, 0] : [1 / 3, 14 / 9, 1 / 9];
  const [alpha2, a2, b2] = order === 4 ? [1 / 10, 6 / 5, 0] : [2 / 11, 12 / 11, 3 / 11];
  return {
    stencils: null,
    third: null,
    first: (theta) =>
      (a * Math.sin(theta) + (b / 2) * Math.sin(2 * theta)) / (1 + 2 * alpha * Math.cos(theta)),
    second: (theta) =>
      (4 * a2 * Math.sin(theta / 2) ** 2 + b2 * Math.sin(theta) ** 2) / (1 + 2 * alpha2 * Math.cos(theta)),
  };
}

/**
 * Fourier differentiation: every mode exactly, the first derivative of the highest mode of an even number zero.
 *
 * @example fourierScheme.second(1) // 1
 * @see L. N. Trefethen, Spectral Methods in MATLAB, SIAM, 2000, chapter 3
 */
export const fourierScheme: PeriodicScheme = {
  stencils: null,
  third: (theta) => (isHighest(theta) ? 0 : theta ** 3),
  first: (theta) => (isHighest(theta) ? 0 : theta),
  second: (theta) => theta * theta,
};

function isHighest(theta: number): boolean {
  return Math.abs(theta) >= Math.PI * (1 - 1e-12);
}

function sum(last: number, term: (m: number) => number): number {
  let total = 0;
  for (let m = 1; m <= last; m++) total += term(m);
  return total;
}

/** A matrix whose rows are one row shifted round: out_j = sum over m of weights_m u_(j + m - reach). */
export class CirculantOperator {
  private readonly extended: Float64Array;

  /**
   * @param n nodes
   * @param weights of the nodes from -reach on
   * @param reach nodes to the left of the centre
   */
  constructor(
    private readonly n: number,
    readonly weights: Float64Array,
    private readonly reach: number,
  ) {
    this.extended = new Float64Array(n + weights.length - 1);
  }

  apply(u: Float64Array, out: Float64Array): void {
    const { n, weights, reach, extended } = this;
    extended.set(u, reach);
    for (let j = 0; j < reach; j++) extended[j] = u[n - reach + j];
    for (let j = n + reach; j < extended.length; j++) extended[j] = u[j - n - reach];
    const whole = weights.length - (weights.length % 4);
    for (let j = 0; j < n; j++) {
      // Four sums side by side: one alone would wait for each addition.
      let [a, b, c, d] = [0, 0, 0, 0];
      for (let m = 0; m < whole; m += 4) {
        a += weights[m] * extended[j + m];
        b += weights[m + 1] * extended[j + m + 1];
        c += weights[m + 2] * extended[j + m + 2];
        d += weights[m + 3] * extended[j + m + 3];
      }
      for (let m = whole; m < weights.length; m++) a += weights[m] * extended[j + m];
      out[j] = a + c + (b + d);
    }
  }
}

/**
 * A scheme's first and second derivative as operators on nodal values.
 *
 * @param scheme the discretisation
 * @param n nodes
 * @param h spacing
 * @returns both operators
 * @example periodicOperators(fourierScheme, 24, Math.PI / 12).first.apply(u, out)
 * @see Trefethen 2000, chapter 3 (differentiation matrices are circulant)
 */
export function periodicOperators(
  scheme: PeriodicScheme,
  n: number,
  h: number,
): { first: CirculantOperator; second: CirculantOperator } {
  const { stencils } = scheme;
  if (stencils) {
    const operator = (weights: Float64Array, scale: number) =>
      new CirculantOperator(
        n,
        weights.map((weight) => weight * scale),
        (weights.length - 1) / 2,
      );
    return { first: operator(stencils.first, 1 / h), second: operator(stencils.second, 1 / (h * h)) };
  }
  const angles = modeNumbers(n).map((k) => (2 * Math.PI * k) / n);
  const first = inverseFourierTransform(
    new Float64Array(n),
    angles.map((theta) => scheme.first(theta) / h),
  ).re;
  const second = inverseFourierTransform(
    angles.map((theta) => -scheme.second(theta) / (h * h)),
    null,
  ).re;
  return { first: operatorOfColumn(first), second: operatorOfColumn(second) };
}

/** Weights of a compact scheme fall off exponentially; those at round-off are left out. */
function operatorOfColumn(column: Float64Array): CirculantOperator {
  const n = column.length;
  const most = Math.floor((n - 1) / 2);
  const smallest = 4e-16 * column.reduce((largest, value) => Math.max(largest, Math.abs(value)), 0);
  // The inverse transform gives the column; the row runs the other way round.
  const weight = (m: number) => column[((-m % n) + n) % n];
  let reach = most;
  while (reach > 0 && Math.abs(weight(reach)) < smallest && Math.abs(weight(-reach)) < smallest) reach -= 1;
  // An even number of nodes has one more weight, half-way round.
  const isWhole = reach === most;
  const length = isWhole ? n : 2 * reach + 1;
  return new CirculantOperator(
    n,
    Float64Array.from({ length }, (_, k) => weight(k - reach)),
    reach,
  );
}
