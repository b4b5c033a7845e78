/** Functions that an expression may call, with the fewest and the most arguments. */
export const functionArity: ReadonlyMap<string, readonly [number, number]> = new Map([
  ["sin", [1, 1]],
  ["cos", [1, 1]],
  ["tan", [1, 1]],
  ["asin", [1, 1]],
  ["acos", [1, 1]],
  ["atan", [1, 1]],
  ["atan2", [2, 2]],
  ["sinh", [1, 1]],
  ["cosh", [1, 1]],
  ["tanh", [1, 1]],
  ["sech", [1, 1]],
  ["exp", [1, 1]],
  ["log", [1, 1]],
  ["sqrt", [1, 1]],
  ["abs", [1, 1]],
  ["sign", [1, 1]],
  ["min", [2, 8]],
  ["max", [2, 8]],
  ["erf", [1, 1]],
  ["erfc", [1, 1]],
  ["mod", [2, 2]],
  ["re", [1, 1]],
  ["im", [1, 1]],
  ["conj", [1, 1]],
]);

/** Constants by name; i only where the fields are complex. */
export const constantNames: ReadonlySet<string> = new Set(["pi", "e", "i"]);

/**
 * True of names that no variable, parameter or named expression may take.
 *
 * @example isReservedName("sin") // true
 * @see functionArity
 */
export function isReservedName(name: string): boolean {
  return name === "d" || functionArity.has(name) || constantNames.has(name);
}
