import { erf, erfc } from "./error-function";
import type { UnaryName } from "./operation";

/** Coefficients f^(k)(a)/k! for k = 0..order. */
type Coefficients = number[];

function product(a: Coefficients, b: Coefficients): Coefficients {
  return a.map((_, k) => sumTo(k, (j) => a[j] * b[k - j]));
}

function sumTo(last: number, term: (j: number) => number): number {
  let sum = 0;
  for (let j = 0; j <= last; j++) sum += term(j);
  return sum;
}

/** 1/a as a series. */
function reciprocal(a: Coefficients): Coefficients {
  const out: Coefficients = [];
  for (let k = 0; k < a.length; k++) {
    out.push(k === 0 ? 1 / a[0] : -sumTo(k - 1, (j) => out[j] * a[k - j]) / a[0]);
  }
  return out;
}

/** exp of a series, from y' = a' y. */
function exponential(a: Coefficients): Coefficients {
  const out = [Math.exp(a[0])];
  for (let k = 1; k < a.length; k++) out.push(sumTo(k - 1, (j) => (j + 1) * a[j + 1] * out[k - 1 - j]) / k);
  return out;
}

/** The series whose derivative is given and whose value is known. */
function integral(value: number, derivative: Coefficients): Coefficients {
  return derivative.map((_, k) => (k === 0 ? value : derivative[k - 1] / k));
}

/** y' = 1 + sign y^2: the tangent with +1, the hyperbolic tangent with -1. */
function tangent(value: number, sign: 1 | -1, order: number): Coefficients {
  const out = [value];
  for (let k = 0; k < order; k++) {
    const square = sumTo(k, (j) => out[j] * out[k - j]);
    out.push(((k === 0 ? 1 : 0) + sign * square) / (k + 1));
  }
  return out;
}

/** Derivatives that repeat with period four, such as sine's, divided by the factorials. */
function periodic(derivatives: readonly [number, number, number, number], order: number): Coefficients {
  let factorial = 1;
  return Array.from({ length: order + 1 }, (_, k) => {
    factorial *= Math.max(k, 1);
    return derivatives[k % 4] / factorial;
  });
}

/**
 * Taylor coefficients of a real power about a value.
 *
 * @param a the value
 * @param exponent any number
 * @param order highest degree
 * @returns order + 1 coefficients
 * @example powerTaylor(1, 2, 2) // [1, 2, 1]
 * @see Griewank and Walther 2008, table 13.2
 */
export function powerTaylor(a: number, exponent: number, order: number): Coefficients {
  let factor = 1;
  return Array.from({ length: order + 1 }, (_, k) => {
    if (k > 0) factor *= (exponent - k + 1) / k;
    return factor === 0 ? 0 : factor * Math.pow(a, exponent - k);
  });
}

/**
 * Taylor coefficients of a function of one argument about a value.
 *
 * Where the function has a jump or a corner (sign, abs at 0) the coefficients are those of the side that the value
 * lies on.
 *
 * @param name the function
 * @param a the value
 * @param order highest degree
 * @returns order + 1 coefficients, the function's value first
 * @example unaryTaylor("exp", 0, 2) // [1, 1, 0.5]
 * @see Griewank and Walther 2008, section 13.2
 */
export function unaryTaylor(name: UnaryName, a: number, order: number): Coefficients {
  const line = Array.from({ length: order + 1 }, (_, k) => (k === 0 ? a : k === 1 ? 1 : 0));
  const [sine, cosine] = [Math.sin(a), Math.cos(a)];
  const [sinh, cosh] = [Math.sinh(a), Math.cosh(a)];
  switch (name) {
    case "neg":
      return line.map((value) => -value);
    case "sin":
      return periodic([sine, cosine, -sine, -cosine], order);
    case "cos":
      return periodic([cosine, -sine, -cosine, sine], order);
    case "sinh":
      return periodic([sinh, cosh, sinh, cosh], order);
    case "cosh":
      return periodic([cosh, sinh, cosh, sinh], order);
    case "tan":
      return tangent(Math.tan(a), 1, order);
    case "tanh":
      return tangent(Math.tanh(a), -1, order);
    case "sech":
      return reciprocal(periodic([cosh, sinh, cosh, sinh], order));
    case "exp":
      return exponential(line);
    case "log":
      return integral(Math.log(a), powerTaylor(a, -1, order));
    case "sqrt":
      return powerTaylor(a, 0.5, order);
    case "abs":
      return line.map((value) => (a < 0 ? -value : value));
    case "sign":
      return line.map((_, k) => (k === 0 ? Math.sign(a) : 0));
    case "atan":
      return integral(Math.atan(a), reciprocal(product(line, line).map((v, k) => (k === 0 ? v + 1 : v))));
    case "asin":
      return integral(Math.asin(a), arcsineDerivative(line));
    case "acos":
      return integral(
        Math.acos(a),
        arcsineDerivative(line).map((value) => -value),
      );
    case "erf":
      return integral(erf(a), gaussian(line));
    case "erfc":
      return integral(
        erfc(a),
        gaussian(line).map((value) => -value),
      );
  }
}

/** (1 - x^2)^(-1/2) as a series, from y' (1 - x^2) = x y. */
function arcsineDerivative(line: Coefficients): Coefficients {
  const square = product(line, line).map((value, k) => (k === 0 ? 1 - value : -value));
  const out = [1 / Math.sqrt(square[0])];
  for (let k = 1; k < line.length; k++) {
    const known = sumTo(k - 1, (j) => (-0.5 * (k - j) - j) * out[j] * square[k - j]);
    out.push(known / (k * square[0]));
  }
  return out;
}

/** 2/sqrt(pi) exp(-x^2) as a series. */
function gaussian(line: Coefficients): Coefficients {
  return exponential(product(line, line).map((value) => -value)).map((v) => (2 / Math.sqrt(Math.PI)) * v);
}
