import { DataError } from "../scoring/data-error";
import type { OperationList } from "./operation-list";
import type { UnaryName } from "./operation";

/** Steps that hold the real and the imaginary part; null where the value is real. */
export interface ComplexValue {
  re: number;
  im: number | null;
}

/** Writes complex arithmetic as steps on real numbers, so that every evaluator handles real steps alone. */
export class ComplexArithmetic {
  constructor(private readonly list: OperationList) {}

  add(a: ComplexValue, b: ComplexValue): ComplexValue {
    return { re: this.list.binary("add", a.re, b.re), im: this.sumOfParts("add", a.im, b.im) };
  }

  subtract(a: ComplexValue, b: ComplexValue): ComplexValue {
    return { re: this.list.binary("sub", a.re, b.re), im: this.sumOfParts("sub", a.im, b.im) };
  }

  multiply(a: ComplexValue, b: ComplexValue): ComplexValue {
    const { list } = this;
    const re = list.binary("mul", a.re, b.re);
    if (a.im === null) return { re, im: b.im === null ? null : list.binary("mul", a.re, b.im) };
    if (b.im === null) return { re, im: list.binary("mul", a.im, b.re) };
    return {
      re: list.binary("sub", re, list.binary("mul", a.im, b.im)),
      im: list.binary("add", list.binary("mul", a.re, b.im), list.binary("mul", a.im, b.re)),
    };
  }

  divide(a: ComplexValue, b: ComplexValue): ComplexValue {
    const { list } = this;
    if (b.im === null) {
      const im = a.im === null ? null : list.binary("div", a.im, b.re);
      return { re: list.binary("div", a.re, b.re), im };
    }
    const size = list.binary("add", list.binary("mul", b.re, b.re), list.binary("mul", b.im, b.im));
    const product = this.multiply(a, this.conjugate(b));
    return this.divide(product, { re: size, im: null });
  }

  power(a: ComplexValue, b: ComplexValue): ComplexValue {
    const { list } = this;
    const exponent = b.im === null ? list.constantAt(b.re) : null;
    const isWhole = exponent !== null && Number.isInteger(exponent) && Math.abs(exponent) <= 32;
    if (a.im === null && b.im === null) {
      if (isWhole) return { re: list.wholePower(a.re, exponent), im: null };
      if (exponent === 0.5) return { re: list.unary("sqrt", a.re), im: null };
      return { re: list.binary("pow", a.re, b.re), im: null };
    }
    if (isWhole) return this.wholePower(a, exponent);
    return this.exponential(this.multiply(b, this.logarithm(a)));
  }

  negate(a: ComplexValue): ComplexValue {
    return { re: this.list.unary("neg", a.re), im: a.im === null ? null : this.list.unary("neg", a.im) };
  }

  conjugate(a: ComplexValue): ComplexValue {
    return { re: a.re, im: a.im === null ? null : this.list.unary("neg", a.im) };
  }

  modulus(a: ComplexValue): ComplexValue {
    const { list } = this;
    if (a.im === null) return { re: list.unary("abs", a.re), im: null };
    const square = list.binary("add", list.binary("mul", a.re, a.re), list.binary("mul", a.im, a.im));
    return { re: list.unary("sqrt", square), im: null };
  }

  select(test: number, then: ComplexValue, otherwise: ComplexValue): ComplexValue {
    const re = this.list.select(test, then.re, otherwise.re);
    if (then.im === null && otherwise.im === null) return { re, im: null };
    const zero = this.list.constant(0);
    return { re, im: this.list.select(test, then.im ?? zero, otherwise.im ?? zero) };
  }

  /** A function of one argument; those without a complex continuation here are refused. */
  apply(name: UnaryName, a: ComplexValue): ComplexValue {
    if (name === "abs") return this.modulus(a);
    if (a.im === null) return { re: this.list.unary(name, a.re), im: null };
    const real = (value: number): ComplexValue => ({ re: value, im: null });
    const one = real(this.list.constant(1));
    switch (name) {
      case "exp":
        return this.exponential(a);
      case "log":
        return this.logarithm(a);
      case "sqrt":
        return this.squareRoot(a, a.im);
      case "sin":
        return this.product(a, a.im, "sin", "cosh", "cos", "sinh", false);
      case "cos":
        return this.product(a, a.im, "cos", "cosh", "sin", "sinh", true);
      case "sinh":
        return this.product(a, a.im, "sinh", "cos", "cosh", "sin", false);
      case "cosh":
        return this.product(a, a.im, "cosh", "cos", "sinh", "sin", false);
      case "tan":
        return this.divide(this.apply("sin", a), this.apply("cos", a));
      case "tanh":
        return this.divide(this.apply("sinh", a), this.apply("cosh", a));
      case "sech":
        return this.divide(one, this.apply("cosh", a));
      default:
        throw new DataError(
          "expression/complex-argument",
          `The function ${name} takes real arguments; this one is complex. Write re(...) or im(...) about it.`,
        );
    }
  }

  private exponential(a: ComplexValue): ComplexValue {
    const { list } = this;
    const size = list.unary("exp", a.re);
    if (a.im === null) return { re: size, im: null };
    return {
      re: list.binary("mul", size, list.unary("cos", a.im)),
      im: list.binary("mul", size, list.unary("sin", a.im)),
    };
  }

  private logarithm(a: ComplexValue): ComplexValue {
    const im = a.im ?? this.list.constant(0);
    const size = this.modulus(a).re;
    return { re: this.list.unary("log", size), im: this.list.binary("atan2", im, a.re) };
  }

  private squareRoot(a: ComplexValue, im: number): ComplexValue {
    const { list } = this;
    const size = this.modulus(a).re;
    const half = list.constant(0.5);
    const real = list.unary("sqrt", list.binary("mul", half, list.binary("add", size, a.re)));
    const imaginary = list.unary("sqrt", list.binary("mul", half, list.binary("sub", size, a.re)));
    const isBelow = list.binary("less", im, list.constant(0));
    return { re: real, im: list.select(isBelow, list.unary("neg", imaginary), imaginary) };
  }

  /** f(x) g(y) + i p(x) q(y), the shape of the addition theorems of sine and cosine. */
  private product(
    a: ComplexValue,
    im: number,
    f: UnaryName,
    g: UnaryName,
    p: UnaryName,
    q: UnaryName,
    isNegated: boolean,
  ): ComplexValue {
    const { list } = this;
    const imaginary = list.binary("mul", list.unary(p, a.re), list.unary(q, im));
    return {
      re: list.binary("mul", list.unary(f, a.re), list.unary(g, im)),
      im: isNegated ? list.unary("neg", imaginary) : imaginary,
    };
  }

  private wholePower(a: ComplexValue, exponent: number): ComplexValue {
    const one = { re: this.list.constant(1), im: null };
    if (exponent < 0) return this.divide(one, this.wholePower(a, -exponent));
    let result: ComplexValue = one;
    for (let k = 0; k < exponent; k++) result = this.multiply(result, a);
    return result;
  }

  private sumOfParts(name: "add" | "sub", a: number | null, b: number | null): number | null {
    if (a === null && b === null) return null;
    if (b === null) return a;
    if (a === null) return name === "add" ? b : this.list.unary("neg", b);
    return this.list.binary(name, a, b);
  }
}
