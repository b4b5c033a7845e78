/** Weighted sums over the nodes that every error norm is made of, gathered in one pass. */

/** Values are added plainly within a block and compensated between blocks: block errors stay below 64 eps/2. */
const blockLength = 64;

/**
 * Sums of the error e = u - u* and of u* over weighted nodes.
 *
 * Fields are added run by run of consecutive values, so that a grid may be passed in pieces. The sum over each block
 * of 64 values is plain; blocks are added with Neumaier's compensation, so that the result does not depend on how the
 * grid is cut up beyond 1e-14 relative.
 *
 * @example
 * const sums = new ErrorSums();
 * sums.add(u, exact, weights);
 * sums.errorL1; // sum of w |u - u*|
 * @see LeVeque 2007, appendix A (grid-weighted norms); Neumaier 1974 (compensated summation)
 */
export class ErrorSums {
  /** Largest |e| and largest |u*|. */
  errorMax = 0;
  exactMax = 0;
  private readonly totals = new Float64Array(6);
  private readonly lost = new Float64Array(6);

  /** Sum of w |e|. */
  get errorL1(): number {
    return this.totals[0] + this.lost[0];
  }
  /** Sum of w |e|^2. */
  get errorSquare(): number {
    return this.totals[1] + this.lost[1];
  }
  /** Sum of w |u*|. */
  get exactL1(): number {
    return this.totals[2] + this.lost[2];
  }
  /** Sum of w |u*|^2. */
  get exactSquare(): number {
    return this.totals[3] + this.lost[3];
  }
  /** Sum of w e: the mass defect. */
  get defect(): number {
    return this.totals[4] + this.lost[4];
  }
  /** Imaginary part of the sum of w e. */
  get imaginaryDefect(): number {
    return this.totals[5] + this.lost[5];
  }

  /**
   * Adds `weights.length` real values from `start` on.
   *
   * @param u values of the field
   * @param exact exact values at the same places as `u`
   * @param weights quadrature weights of the values along the fastest axis
   * @param start index of the first value in `u` and `exact`
   * @param outer weight of this row along the slower axes
   */
  add(
    u: Float64Array,
    exact: Float64Array,
    weights: Float64Array,
    start: number = 0,
    outer: number = 1,
  ): void {
    const count = weights.length;
    let errorMax = this.errorMax;
    let exactMax = this.exactMax;
    for (let from = 0; from < count; from += blockLength) {
      const to = Math.min(count, from + blockLength);
      let errorL1 = 0;
      let errorSquare = 0;
      let exactL1 = 0;
      let exactSquare = 0;
      let defect = 0;
      for (let j = from; j < to; j++) {
        const x = exact[start + j];
        const e = u[start + j] - x;
        const w = weights[j];
        const size = Math.abs(e);
        const exactSize = Math.abs(x);
        errorL1 += w * size;
        errorSquare += w * e * e;
        exactL1 += w * exactSize;
        exactSquare += w * x * x;
        defect += w * e;
        if (size > errorMax) errorMax = size;
        if (exactSize > exactMax) exactMax = exactSize;
      }
      this.keep(0, outer * errorL1);
      this.keep(1, outer * errorSquare);
      this.keep(2, outer * exactL1);
      this.keep(3, outer * exactSquare);
      this.keep(4, outer * defect);
    }
    this.errorMax = errorMax;
    this.exactMax = exactMax;
  }

  /** The same for complex values; |e| and |u*| are moduli. */
  addComplex(
    u: { values: Float64Array; imaginary: Float64Array },
    exact: { values: Float64Array; imaginary: Float64Array },
    weights: Float64Array,
    start: number = 0,
    outer: number = 1,
  ): void {
    const count = weights.length;
    for (let from = 0; from < count; from += blockLength) {
      const to = Math.min(count, from + blockLength);
      const sums = [0, 0, 0, 0, 0, 0];
      for (let j = from; j < to; j++) {
        const i = start + j;
        const re = u.values[i] - exact.values[i];
        const im = u.imaginary[i] - exact.imaginary[i];
        const square = re * re + im * im;
        const exactSquare = exact.values[i] ** 2 + exact.imaginary[i] ** 2;
        const size = Math.sqrt(square);
        const exactSize = Math.sqrt(exactSquare);
        const w = weights[j];
        sums[0] += w * size;
        sums[1] += w * square;
        sums[2] += w * exactSize;
        sums[3] += w * exactSquare;
        sums[4] += w * re;
        sums[5] += w * im;
        if (size > this.errorMax) this.errorMax = size;
        if (exactSize > this.exactMax) this.exactMax = exactSize;
      }
      for (let k = 0; k < 6; k++) this.keep(k, outer * sums[k]);
    }
  }

  /** Adds a block's sum, keeping what rounding would lose (Neumaier 1974). */
  private keep(k: number, value: number): void {
    const total = this.totals[k];
    const sum = total + value;
    this.lost[k] += Math.abs(total) >= Math.abs(value) ? total - sum + value : value - sum + total;
    this.totals[k] = sum;
  }
}
