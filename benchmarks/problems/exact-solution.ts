import { type CompiledExpression, compileExpression } from "../expressions/compile-expression";
import { evaluateOnGrid, type GridValues } from "../expressions/evaluate-on-grid";
import { builtIn } from "./built-ins";
import type { ProblemDefinition } from "./definition";
import { contextOf, parameterValues } from "./problem-context";

const compiledSolutions = new WeakMap<ProblemDefinition, Map<string, CompiledExpression>>();

/**
 * The exact solution of a field at every node of a tensor grid.
 *
 * @param problem its definition; what is compiled for it is kept as long as the object lives
 * @param field name of a field with an exact solution
 * @param t time in the problem's unit; null for a steady problem
 * @param coordinates nodes of each axis, in the order of the problem's axes
 * @param out optional, written to and returned
 * @returns values, row-major, first axis slowest; the imaginary part null where the field is real
 * @throws RangeError where the field has no exact solution or the time is missing
 * @throws DataError `expression/...` where the definition's expression is refused
 * @example evaluateExact(shippedProblem("advection-exp-sine"), "u", 3, [nodes]).values
 * @see problem.sources
 */
export function evaluateExact(
  problem: ProblemDefinition,
  field: string,
  t: number | null,
  coordinates: readonly Float64Array[],
  out?: { values: Float64Array; imaginary?: Float64Array | null },
): GridValues {
  if (t === null && !problem.classification.isSteady) {
    throw new RangeError(`${problem.slug} depends on time; a time was expected, null was given`);
  }
  const point = { coordinates, t, parameters: parameterValues(problem) };
  if (problem.exact.kind === "builtIn") return builtIn(problem.exact.name).evaluate(field, point, out);
  return evaluateOnGrid(compileExact(problem, field), point, out);
}

/**
 * The compiled exact solution of a field.
 *
 * @throws RangeError where the field has no exact solution
 * @example compileExact(problem, "u").outputs.length // 1
 * @see compileExpression
 */
export function compileExact(problem: ProblemDefinition, field: string): CompiledExpression {
  const known = compiledSolutions.get(problem) ?? new Map<string, CompiledExpression>();
  compiledSolutions.set(problem, known);
  const found = known.get(field);
  if (found) return found;
  if (problem.exact.kind !== "expression" || problem.exact.fields[field] === undefined) {
    throw new RangeError(`${problem.slug} has no exact solution of a field "${field}"`);
  }
  const compiled = compileExpression(problem.exact.fields[field], contextOf(problem));
  known.set(field, compiled);
  return compiled;
}
