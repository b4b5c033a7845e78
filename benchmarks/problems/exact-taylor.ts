import { evaluateTaylor, type TaylorValue } from "../expressions/evaluate-taylor";
import type { Series, TaylorSpace } from "../expressions/taylor-space";
import { builtIn } from "./built-ins";
import type { ProblemDefinition } from "./definition";
import { compileExact } from "./exact-solution";
import { readDerivativeName } from "./identity-terms";
import { parameterValues } from "./problem-context";

/** A point of the space-time domain: values of x, y and t as far as the problem has them. */
export type Place = Record<string, number>;

/**
 * The exact solution of each field as a Taylor polynomial about a point.
 *
 * @param space in the problem's axes and t
 * @param place a value of every axis, and of t unless the problem is steady
 * @returns by field
 * @throws RangeError where a field has no exact solution
 * @example exactTaylor(problem, space, { x: 1, t: 0 }).get("u")
 * @see evaluateTaylor
 */
export function exactTaylor(
  problem: ProblemDefinition,
  space: TaylorSpace,
  place: Place,
): Map<string, TaylorValue> {
  const valueOf = placeSeries(problem, space, place);
  const { exact } = problem;
  const taylorOf = (field: string) =>
    exact.kind === "builtIn"
      ? builtIn(exact.name).taylor(field, space, valueOf)
      : evaluateTaylor(compileExact(problem, field), space, valueOf)[0];
  return new Map(problem.fields.map(({ name }) => [name, taylorOf(name)]));
}

/**
 * Axes and t as variables of the space about a place; parameters as constants.
 *
 * @returns the polynomial of a name
 * @throws RangeError, when called, for a name without a value
 * @example placeSeries(problem, space, { x: 1, t: 0 })("x")
 * @see exactTaylor
 */
export function placeSeries(
  problem: ProblemDefinition,
  space: TaylorSpace,
  place: Place,
): (variable: string) => Series {
  const parameters = parameterValues(problem);
  return (variable) => {
    if (place[variable] !== undefined) return space.variable(variable, place[variable]);
    if (parameters[variable] !== undefined) return space.constant(parameters[variable]);
    throw new RangeError(`"${variable}" has no value at a point of ${problem.slug}`);
  };
}

/**
 * The variables of a problem's Taylor space: its axes, and t unless it is steady.
 *
 * @example spaceVariables(problem) // ["x", "t"]
 * @see TaylorSpace
 */
export function spaceVariables(problem: ProblemDefinition): string[] {
  return [...problem.axes.map((axis) => axis.name), ...(problem.classification.isSteady ? [] : ["t"])];
}

/**
 * A field or one of its derivatives as a polynomial.
 *
 * @param exact from `exactTaylor`
 * @returns null for a name that is neither
 * @example fieldSeries("u_xx", exact, space)
 * @see exactTaylor
 */
export function fieldSeries(
  name: string,
  exact: Map<string, TaylorValue>,
  space: TaylorSpace,
): Series | null {
  const isImaginary = name.startsWith("im ");
  const bare = isImaginary ? name.slice(3) : name;
  const read = readDerivativeName(bare, [...exact.keys()]) ?? { field: bare, along: [] };
  const value = exact.get(read.field);
  if (!value) return null;
  const series = isImaginary ? (value.im ?? space.constant(0)) : value.re;
  return read.along.reduce((derivative, direction) => space.differentiate(derivative, direction), series);
}
