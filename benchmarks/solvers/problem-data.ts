import { type CompiledExpression, compileExpression } from "../expressions/compile-expression";
import { evaluateAtPoint, evaluateOnGrid } from "../expressions/evaluate-on-grid";
import type { BoundaryCondition, ProblemDefinition } from "../problems/definition";
import { contextOf, parameterValues } from "../problems/problem-context";

/**
 * The value of a parameter.
 *
 * @throws RangeError where the problem has no such parameter
 * @example parameter(problem, "nu")
 * @see ProblemDefinition.parameters
 */
export function parameter(problem: ProblemDefinition, name: string): number {
  const found = problem.parameters.find((candidate) => candidate.name === name);
  if (!found) throw new RangeError(`${problem.slug} has no parameter "${name}"`);
  return found.value;
}

/**
 * The initial values of a field, or of its time derivative, on nodes.
 *
 * @throws RangeError where the problem states none
 * @example initialValues(problem, "u", 0, [x])
 * @see ProblemDefinition.initialConditions
 */
export function initialValues(
  problem: ProblemDefinition,
  field: string,
  timeDerivative: 0 | 1,
  coordinates: Float64Array[],
): { values: Float64Array; imaginary: Float64Array | null } {
  const found = problem.initialConditions.find(
    (condition) => condition.field === field && condition.timeDerivative === timeDerivative,
  );
  if (!found) throw new RangeError(`${problem.slug} has no initial condition of "${field}"`);
  const compiled = compileExpression(found.expression, contextOf(problem));
  return evaluateOnGrid(compiled, {
    coordinates,
    t: problem.initialTime,
    parameters: { ...parameterValues(problem), t: problem.initialTime },
  });
}

/**
 * A named expression of a problem as a function of time on fixed nodes.
 *
 * @throws RangeError where the problem has no such expression
 * @example namedExpression(problem, "f", [x])(0.5)
 * @see ProblemDefinition.expressions
 */
export function namedExpression(
  problem: ProblemDefinition,
  name: string,
  coordinates: Float64Array[],
): (t: number | null) => Float64Array {
  const found = problem.expressions.find((candidate) => candidate.name === name);
  if (!found) throw new RangeError(`${problem.slug} has no expression "${name}"`);
  const compiled: CompiledExpression = compileExpression(found.expression, contextOf(problem));
  const parameters = parameterValues(problem);
  const nodes = coordinates.reduce((product, axis) => product * axis.length, 1);
  const values = new Float64Array(nodes);
  return (t) => evaluateOnGrid(compiled, { coordinates, t, parameters }, { values }).values;
}

/** A boundary condition at an end with its coefficients as numbers and its data as a function of time. */
export interface EndCondition {
  alpha: number;
  beta: number;
  g: (t: number) => number;
}

/**
 * The condition at an end of an axis of a one-dimensional problem, or of one whose coefficients are constants.
 *
 * @throws RangeError where the problem states none
 * @example endCondition(problem, "x", "a").beta // 1 of a Neumann end
 * @see ProblemDefinition.boundaryConditions
 */
export function endCondition(problem: ProblemDefinition, axis: "x" | "y", end: "a" | "b"): EndCondition {
  const found = problem.boundaryConditions.find(
    (condition) => condition.axis === axis && condition.end === end,
  );
  if (!found) throw new RangeError(`${problem.slug} has no condition at end ${end} of ${axis}`);
  const place = endPlace(problem, found);
  const context = contextOf(problem);
  const known = { ...parameterValues(problem), ...place };
  const value = (text: string) =>
    evaluateAtPoint(compileExpression(text, context), { ...known, t: problem.initialTime });
  const data = compileExpression(found.g, context);
  const isZero = found.g.trim() === "0";
  return {
    alpha: value(found.alpha),
    beta: value(found.beta),
    g: (t) => (isZero ? 0 : evaluateAtPoint(data, { ...known, t })),
  };
}

function endPlace(problem: ProblemDefinition, condition: BoundaryCondition): Record<string, number> {
  return Object.fromEntries(
    problem.axes.map((axis) => [
      axis.name,
      axis.name === condition.axis ? axis[condition.end] : (axis.a + axis.b) / 2,
    ]),
  );
}

/**
 * The last output time of an unsteady problem.
 *
 * @example finalTime(problem) // 3
 * @see ProblemDefinition.outputTimes
 */
export function finalTime(problem: ProblemDefinition): number {
  return Math.max(...problem.outputTimes);
}

/**
 * The length of an axis.
 *
 * @param axis index of the axis
 * @example axisLength(problem, 0) // 2 pi
 * @see ProblemDefinition.axes
 */
export function axisLength({ axes }: ProblemDefinition, axis: number): number {
  return axes[axis].b - axes[axis].a;
}
