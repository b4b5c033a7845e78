import type { ExpressionContext } from "../expressions/compile-expression";
import type { ProblemDefinition } from "./definition";

/**
 * Names that the expressions of a problem may use: its axes, t, parameters and named expressions.
 *
 * @returns a context for `compileExpression`
 * @example contextOf(problem).axes // ["x"]
 * @see compileExpression
 */
export function contextOf(problem: ProblemDefinition): ExpressionContext {
  const named = Object.fromEntries(problem.expressions.map(({ name, expression }) => [name, expression]));
  return {
    axes: problem.axes.map((axis) => axis.name),
    scalars: [
      ...(problem.classification.isSteady ? [] : ["t"]),
      ...problem.parameters.map(({ name }) => name),
    ],
    named,
    isComplex: problem.fields.some((field) => field.values === "complex"),
  };
}

/**
 * Values of a problem's parameters by name.
 *
 * @example parameterValues(problem).nu
 * @see ProblemDefinition.parameters
 */
export function parameterValues(problem: ProblemDefinition): Record<string, number> {
  return Object.fromEntries(problem.parameters.map(({ name, value }) => [name, value]));
}
