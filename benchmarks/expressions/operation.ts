import { erf, erfc } from "./error-function";

export type UnaryName =
  | "neg"
  | "sin"
  | "cos"
  | "tan"
  | "asin"
  | "acos"
  | "atan"
  | "sinh"
  | "cosh"
  | "tanh"
  | "sech"
  | "exp"
  | "log"
  | "sqrt"
  | "abs"
  | "sign"
  | "erf"
  | "erfc";

export type BinaryName =
  | "add"
  | "sub"
  | "mul"
  | "div"
  | "pow"
  | "atan2"
  | "min"
  | "max"
  | "mod"
  | "less"
  | "lessOrEqual"
  | "equal"
  | "unequal";

/**
 * One step of a compiled expression. Operands are indices of earlier steps.
 *
 * `axes` has bit k set where the value changes along axis k, so 0 means one number for the whole grid.
 */
export type Operation = { axes: number } & (
  | { name: "constant"; value: number }
  /** An axis has its index; a scalar one value for the grid; a field a value at every node. */
  | { name: "variable"; variable: string; source: number | "scalar" | "field" }
  | { name: UnaryName; a: number }
  | { name: BinaryName; a: number; b: number }
  | { name: "select"; test: number; then: number; otherwise: number }
  | { name: "derivative"; a: number; along: string }
);

/**
 * a modulo b with the sign of b, as the floor of the quotient defines it.
 *
 * @example modulo(-0.25, 1) // 0.75
 * @see D. E. Knuth, The Art of Computer Programming, volume 1, section 1.2.4 (from memory)
 */
export function modulo(a: number, b: number): number {
  return a - b * Math.floor(a / b);
}

/** What each function of one argument computes, for one number. */
export const unaryFunctions: Record<UnaryName, (a: number) => number> = {
  neg: (a) => -a,
  sin: Math.sin,
  cos: Math.cos,
  tan: Math.tan,
  asin: Math.asin,
  acos: Math.acos,
  atan: Math.atan,
  sinh: Math.sinh,
  cosh: Math.cosh,
  tanh: Math.tanh,
  sech: (a) => 1 / Math.cosh(a),
  exp: Math.exp,
  log: Math.log,
  sqrt: Math.sqrt,
  abs: Math.abs,
  sign: Math.sign,
  erf,
  erfc,
};

/** What each function of two arguments computes, for one pair of numbers. */
export const binaryFunctions: Record<BinaryName, (a: number, b: number) => number> = {
  add: (a, b) => a + b,
  sub: (a, b) => a - b,
  mul: (a, b) => a * b,
  div: (a, b) => a / b,
  pow: Math.pow,
  atan2: Math.atan2,
  min: Math.min,
  max: Math.max,
  mod: modulo,
  less: (a, b) => (a < b ? 1 : 0),
  lessOrEqual: (a, b) => (a <= b ? 1 : 0),
  equal: (a, b) => (a === b ? 1 : 0),
  unequal: (a, b) => (a === b ? 0 : 1),
};

/** True of a step with one operand.
 *
 * @example isUnary("sin") // true
 */
export function isUnary(name: Operation["name"]): name is UnaryName {
  return name in unaryFunctions;
}

/** True of a step with two operands.
 *
 * @example isBinary("add") // true
 */
export function isBinary(name: Operation["name"]): name is BinaryName {
  return name in binaryFunctions;
}
