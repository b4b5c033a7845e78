/** Coefficients of a truncated Taylor polynomial, in the order of its space's monomials; the value comes first. */
export type Series = Float64Array;

/**
 * Truncated Taylor polynomials in up to three variables about one point, with their arithmetic.
 *
 * Mixed derivatives up to the order come out exact to rounding.
 *
 * @example new TaylorSpace(["x", "t"], 2).size // 6
 * @see A. Griewank and A. Walther, Evaluating Derivatives, 2nd ed., SIAM, 2008, chapter 13
 */
export class TaylorSpace {
  readonly size: number;
  private readonly exponents: number[][] = [];
  private readonly indexOf = new Map<string, number>();
  /** Triples (i, j, k) with monomial i times monomial j = monomial k. */
  private readonly products: Int32Array;

  /**
   * @param variables names, 1 to 3 of them
   * @param order largest total degree kept, 0 to 8
   * @throws RangeError where the order is not a whole number from 0 to 8
   */
  constructor(
    readonly variables: readonly string[],
    readonly order: number,
  ) {
    if (!Number.isInteger(order) || order < 0 || order > 8) {
      throw new RangeError(`a Taylor order is a whole number from 0 to 8, not ${order}`);
    }
    for (let degree = 0; degree <= order; degree++) this.addMonomials([], degree);
    this.size = this.exponents.length;
    this.products = Int32Array.from(this.listProducts());
  }

  constant(value: number): Series {
    const series = new Float64Array(this.size);
    series[0] = value;
    return series;
  }

  /** The variable itself about a value. */
  variable(name: string, value: number): Series {
    const series = this.constant(value);
    const exponents = this.variables.map((other) => (other === name ? 1 : 0));
    const index = this.indexOf.get(exponents.join());
    if (index !== undefined && exponents.includes(1)) series[index] = 1;
    return series;
  }

  combine(a: Series, b: Series, sign: 1 | -1): Series {
    return a.map((value, k) => value + sign * b[k]);
  }

  scale(a: Series, factor: number): Series {
    return a.map((value) => value * factor);
  }

  multiply(a: Series, b: Series): Series {
    const out = new Float64Array(this.size);
    const { products } = this;
    for (let p = 0; p < products.length; p += 3) out[products[p + 2]] += a[products[p]] * b[products[p + 1]];
    return out;
  }

  /** f(a) from the Taylor coefficients of f at the value of a, by Horner's rule in a minus its value. */
  compose(coefficients: ArrayLike<number>, a: Series): Series {
    const step = a.slice();
    step[0] = 0;
    let out = this.constant(coefficients[this.order]);
    for (let k = this.order - 1; k >= 0; k--) {
      out = this.multiply(out, step);
      out[0] += coefficients[k];
    }
    return out;
  }

  /** The derivative along a variable; coefficients of the highest degree are lost, and zero in the result. */
  differentiate(a: Series, variable: string): Series {
    const axis = this.variables.indexOf(variable);
    const out = new Float64Array(this.size);
    if (axis < 0) return out;
    this.exponents.forEach((exponents, k) => {
      if (exponents[axis] === 0) return;
      const lower = exponents.map((exponent, v) => (v === axis ? exponent - 1 : exponent));
      out[this.indexOf.get(lower.join()) ?? 0] = a[k] * exponents[axis];
    });
    return out;
  }

  private addMonomials(prefix: number[], degree: number): void {
    if (prefix.length === this.variables.length - 1 || this.variables.length === 0) {
      const exponents = this.variables.length === 0 ? [] : [...prefix, degree];
      if (this.indexOf.has(exponents.join())) return;
      this.indexOf.set(exponents.join(), this.exponents.length);
      this.exponents.push(exponents);
      return;
    }
    for (let first = degree; first >= 0; first--) this.addMonomials([...prefix, first], degree - first);
  }

  private listProducts(): number[] {
    const triples: number[] = [];
    this.exponents.forEach((left, i) =>
      this.exponents.forEach((right, j) => {
        const k = this.indexOf.get(left.map((exponent, v) => exponent + right[v]).join());
        if (k !== undefined) triples.push(i, j, k);
      }),
    );
    return triples;
  }
}
