import { type CompiledExpression, compileExpression } from "../expressions/compile-expression";
import { evaluateAtPoint } from "../expressions/evaluate-on-grid";
import type { ProblemDefinition } from "./definition";
import { contextOf, parameterValues } from "./problem-context";

const compiledKinks = new WeakMap<ProblemDefinition, CompiledExpression[]>();

/**
 * Places on the x axis where the solution or a derivative jumps, in the order of the definition.
 *
 * @param t time; null for a steady problem
 * @returns one place for each declared kink
 * @throws DataError `expression/...` where a kink cannot be read
 * @example kinkPlaces(problem, 0.5)
 * @see ProblemDefinition.kinks
 */
export function kinkPlaces(problem: ProblemDefinition, t: number | null): number[] {
  let compiled = compiledKinks.get(problem);
  if (!compiled) {
    compiled = problem.kinks.map((text) => compileExpression(text, { ...contextOf(problem), axes: [] }));
    compiledKinks.set(problem, compiled);
  }
  const values = { ...parameterValues(problem), ...(t === null ? {} : { t }) };
  return compiled.map((kink) => evaluateAtPoint(kink, values));
}

/**
 * True where a point of the x axis lies within 1e-3 of its length from a kink.
 *
 * @example isNearKink(problem, 0.3331, null)
 * @see kinkPlaces
 */
export function isNearKink(problem: ProblemDefinition, x: number, t: number | null): boolean {
  if (problem.kinks.length === 0) return false;
  const [axis] = problem.axes;
  const length = axis.b - axis.a;
  return kinkPlaces(problem, t).some((place) => {
    const gap = Math.abs(x - place);
    const distance = axis.kind === "periodic" ? Math.min(gap % length, length - (gap % length)) : gap;
    return distance < 1e-3 * length;
  });
}
