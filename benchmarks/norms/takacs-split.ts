/** The mean-square error of a periodic field, split into dissipation and dispersion. */

/** Shares of the mean-square error; they add up to it. */
export interface TakacsSplit {
  dissipation: number;
  dispersion: number;
  meanSquare: number;
}

/** Values are added plainly within a block and compensated between blocks (Neumaier 1974). */
const blockLength = 64;

/** A compensated sum of the sums over blocks. */
class BlockSum {
  private total = 0;
  private lost = 0;

  add(block: number): void {
    const sum = this.total + block;
    const isTotalLarger = Math.abs(this.total) >= Math.abs(block);
    this.lost += isTotalLarger ? this.total - sum + block : block - sum + this.total;
    this.total = sum;
  }

  mean(n: number): number {
    return (this.total + this.lost) / n;
  }
}

/** Means of u*, e, e^2 and u^2. */
function firstMoments(u: Float64Array, exact: Float64Array) {
  const n = u.length;
  const sums = [new BlockSum(), new BlockSum(), new BlockSum(), new BlockSum()];
  for (let from = 0; from < n; from += blockLength) {
    const to = Math.min(n, from + blockLength);
    let ofExact = 0;
    let ofError = 0;
    let ofErrorSquare = 0;
    let ofSquare = 0;
    for (let j = from; j < to; j++) {
      const e = u[j] - exact[j];
      ofExact += exact[j];
      ofError += e;
      ofErrorSquare += e * e;
      ofSquare += u[j] * u[j];
    }
    sums[0].add(ofExact);
    sums[1].add(ofError);
    sums[2].add(ofErrorSquare);
    sums[3].add(ofSquare);
  }
  const [exactMean, errorMean, errorSquare, square] = sums.map((sum) => sum.mean(n));
  return { exactMean, errorMean, errorSquare, square };
}

/** Means of v^2, (v + d)^2 and d (2 v + d), v and d being u* and e less their means. */
function secondMoments(u: Float64Array, exact: Float64Array, exactMean: number, errorMean: number) {
  const n = u.length;
  const sums = [new BlockSum(), new BlockSum(), new BlockSum()];
  for (let from = 0; from < n; from += blockLength) {
    const to = Math.min(n, from + blockLength);
    let ofExact = 0;
    let ofField = 0;
    let ofGain = 0;
    for (let j = from; j < to; j++) {
      const v = exact[j] - exactMean;
      const d = u[j] - exact[j] - errorMean;
      ofExact += v * v;
      ofField += (v + d) * (v + d);
      ofGain += d * (2 * v + d);
    }
    sums[0].add(ofExact);
    sums[1].add(ofField);
    sums[2].add(ofGain);
  }
  const [exactSquare, square, gain] = sums.map((sum) => sum.mean(n));
  return { exactSquare, square, gain };
}

/** Mean of (d - stretch v)^2. */
function spreadOf(
  u: Float64Array,
  exact: Float64Array,
  exactMean: number,
  errorMean: number,
  stretch: number,
) {
  const n = u.length;
  const sum = new BlockSum();
  for (let from = 0; from < n; from += blockLength) {
    const to = Math.min(n, from + blockLength);
    let block = 0;
    for (let j = from; j < to; j++) {
      const rest = u[j] - exact[j] - errorMean - stretch * (exact[j] - exactMean);
      block += rest * rest;
    }
    sum.add(block);
  }
  return sum.mean(n);
}

/**
 * Splits the mean-square error into dissipation, (sigma_u - sigma_*)^2 + (mean u - mean u*)^2, and dispersion,
 * 2 (1 - rho) sigma_u sigma_*.
 *
 * As written both lose all digits where the error is small. Here both are computed from the error e = u - u*: with
 * v = u* - mean u*, d = e - mean e, w = v + d and D = mean(d (w + v)) / (sigma_u + sigma_*) = sigma_u - sigma_*,
 * dissipation is D^2 + (mean e)^2 and dispersion (sigma_* / sigma_u) mean((d - v D/sigma_*)^2). Neither is found by
 * subtracting the other.
 *
 * @param u values at equally spaced nodes of a periodic axis, real
 * @param exact exact values at the same nodes
 * @returns shares in the unit of u squared, or null where u or u* is constant
 * @throws RangeError where the lengths differ
 * @example takacsSplit(u, exact)?.dispersion
 * @see Takacs 1985, Monthly Weather Review 113, 1050-1065
 */
export function takacsSplit(u: Float64Array, exact: Float64Array): TakacsSplit | null {
  const n = u.length;
  if (exact.length !== n)
    throw new RangeError(`Takacs' split needs two fields of ${n} values, not ${exact.length}`);
  const first = firstMoments(u, exact);
  const second = secondMoments(u, exact, first.exactMean, first.errorMean);
  const sigmaExact = Math.sqrt(second.exactSquare);
  const sigma = Math.sqrt(second.square);
  // A constant u leaves rounding behind: it is formed from u* and the error.
  const rounding = 4 * 2 ** -52 * (sigmaExact + Math.sqrt(first.square));
  if (sigma <= rounding || sigmaExact === 0) return null;
  const difference = second.gain / (sigma + sigmaExact);
  const spread = spreadOf(u, exact, first.exactMean, first.errorMean, difference / sigmaExact);
  return {
    dissipation: difference ** 2 + first.errorMean ** 2,
    dispersion: (sigmaExact / sigma) * spread,
    meanSquare: first.errorSquare,
  };
}
