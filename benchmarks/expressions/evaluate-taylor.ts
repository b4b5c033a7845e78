import type { CompiledExpression } from "./compile-expression";
import { type BinaryName, binaryFunctions, isUnary, type Operation } from "./operation";
import type { Series, TaylorSpace } from "./taylor-space";
import { powerTaylor, unaryTaylor } from "./univariate-taylor";

/** Taylor polynomials of one output; `im` null where it is real. */
export interface TaylorValue {
  re: Series;
  im: Series | null;
}

/**
 * Evaluate a compiled expression in truncated Taylor arithmetic about one point.
 *
 * @param compiled from `compileExpression`
 * @param space variables and order
 * @param valueOf the polynomial of a variable by name; "im u" for the imaginary part of a complex field
 * @returns one value for each output; of `d(expression, axis)` the highest degree is lost
 * @throws RangeError where `valueOf` throws for an unknown name
 * @example evaluateTaylor(compiled, space, (name) => space.variable(name, 0.5))
 * @see Griewank and Walther 2008, chapter 13
 */
export function evaluateTaylor(
  compiled: CompiledExpression,
  space: TaylorSpace,
  valueOf: (variable: string) => Series,
): TaylorValue[] {
  const values: Series[] = [];
  for (const operation of compiled.operations) values.push(evaluateOne(operation, values, space, valueOf));
  return compiled.outputs.map(({ re, im }) => ({ re: values[re], im: im === null ? null : values[im] }));
}

/**
 * The highest derivative that an expression takes of its variables by `d(expression, axis)`, plus the orders that
 * its variables bring themselves.
 *
 * @param orderOf derivatives that a variable's name stands for: 2 of u_xx
 * @example derivativeOrder(compiled, (name) => (name === "u_xx" ? 2 : 0))
 * @see evaluateTaylor
 */
export function derivativeOrder(compiled: CompiledExpression, orderOf: (variable: string) => number): number {
  const orders: number[] = [];
  for (const operation of compiled.operations) {
    const { name } = operation;
    if (name === "variable") orders.push(orderOf(operation.variable));
    else if (name === "constant") orders.push(0);
    else if (name === "derivative") orders.push(orders[operation.a] + 1);
    else if (name === "select") orders.push(Math.max(orders[operation.then], orders[operation.otherwise]));
    else orders.push(Math.max(orders[operation.a], "b" in operation ? orders[operation.b] : 0));
  }
  return compiled.outputs.reduce(
    (most, { re, im }) => Math.max(most, orders[re], im === null ? 0 : orders[im]),
    0,
  );
}

function evaluateOne(
  operation: Operation,
  values: readonly Series[],
  space: TaylorSpace,
  valueOf: (variable: string) => Series,
): Series {
  const { name } = operation;
  if (name === "constant") return space.constant(operation.value);
  if (name === "variable") return valueOf(operation.variable);
  if (name === "derivative") return space.differentiate(values[operation.a], operation.along);
  if (name === "select")
    return values[values[operation.test][0] !== 0 ? operation.then : operation.otherwise];
  if (isUnary(name)) {
    const a = values[(operation as { a: number }).a];
    return space.compose(unaryTaylor(name, a[0], space.order), a);
  }
  const { a, b } = operation as { a: number; b: number };
  return evaluateBinary(name, values[a], values[b], space);
}

function evaluateBinary(name: BinaryName, a: Series, b: Series, space: TaylorSpace): Series {
  switch (name) {
    case "add":
      return space.combine(a, b, 1);
    case "sub":
      return space.combine(a, b, -1);
    case "mul":
      return space.multiply(a, b);
    case "div":
      return divide(a, b, space);
    case "pow":
      return power(a, b, space);
    case "atan2":
      return angle(a, b, space);
    case "min":
      return a[0] <= b[0] ? a : b;
    case "max":
      return a[0] >= b[0] ? a : b;
    case "mod": {
      const turns = Math.floor(a[0] / b[0]);
      return space.combine(a, space.scale(b, turns), -1);
    }
    default:
      return space.constant(binaryFunctions[name](a[0], b[0]));
  }
}

function divide(a: Series, b: Series, space: TaylorSpace): Series {
  return space.multiply(a, space.compose(powerTaylor(b[0], -1, space.order), b));
}

function isConstant(a: Series): boolean {
  return a.every((value, k) => k === 0 || value === 0);
}

function power(a: Series, b: Series, space: TaylorSpace): Series {
  if (isConstant(b)) return space.compose(powerTaylor(a[0], b[0], space.order), a);
  const logarithm = space.compose(unaryTaylor("log", a[0], space.order), a);
  const exponent = space.multiply(b, logarithm);
  return space.compose(unaryTaylor("exp", exponent[0], space.order), exponent);
}

/** The arctangent of the ratio that is at most 1, and the constant that turns it into the angle. */
function angle(y: Series, x: Series, space: TaylorSpace): Series {
  const isFlat = Math.abs(x[0]) >= Math.abs(y[0]);
  const ratio = isFlat ? divide(y, x, space) : space.scale(divide(x, y, space), -1);
  const out = space.compose(unaryTaylor("atan", ratio[0], space.order), ratio);
  out[0] = Math.atan2(y[0], x[0]);
  return out;
}
