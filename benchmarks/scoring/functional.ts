/** The problem's functional, which the grid convergence index is taken of. */

import { compileExpression, type CompiledExpression } from "../expressions/compile-expression";
import { evaluateOnGrid } from "../expressions/evaluate-on-grid";
import type { ProblemDefinition } from "../problems/definition";
import { evaluateExact } from "../problems/exact-solution";
import { contextOf, parameterValues } from "../problems/problem-context";
import { gaussPanels } from "../quadrature/gauss-panels";

/** Panels of 16 Gauss points along each axis for the exact functional. */
const exactPanels = { 1: 128, 2: 16 };

const compiled = new WeakMap<ProblemDefinition, CompiledExpression>();

function integrand(problem: ProblemDefinition, text: string): CompiledExpression {
  const known = compiled.get(problem);
  if (known) return known;
  const made = compileExpression(text, {
    ...contextOf(problem),
    fields: problem.fields.filter((field) => field.isScored).map((field) => field.name),
  });
  compiled.set(problem, made);
  return made;
}

/** Sum of w f (or of w f^2) over a tensor grid; rows are summed plainly in blocks, blocks with compensation. */
function integrate(values: Float64Array, weights: readonly Float64Array[], isSquared: boolean): number {
  const inner = weights[weights.length - 1];
  const outer = weights.length === 2 ? weights[0] : Float64Array.of(1);
  let total = 0;
  let lost = 0;
  for (let i = 0; i < outer.length; i++) {
    const row = i * inner.length;
    for (let from = 0; from < inner.length; from += 64) {
      const to = Math.min(inner.length, from + 64);
      let block = 0;
      for (let j = from; j < to; j++) {
        const value = values[row + j];
        block += inner[j] * (isSquared ? value * value : value);
      }
      block *= outer[i];
      const sum = total + block;
      lost += Math.abs(total) >= Math.abs(block) ? total - sum + block : block - sum + total;
      total = sum;
    }
  }
  return total + lost;
}

/**
 * The functional of gridded fields: the integral of the problem's own integrand, or of the sum of the squares.
 *
 * @param problem the test problem
 * @param fields values of each scored field by name, row-major, real
 * @param coordinates nodes of each axis
 * @param weights quadrature weights of each axis
 * @param t time, null for a steady problem
 * @returns its value, in the integrand's unit times that of the domain's measure
 * @example functionalOf(problem, { u }, [nodes], [weights], 1)
 * @see Celik et al. 2008 (a functional is what the index is reported for)
 */
export function functionalOf(
  problem: ProblemDefinition,
  fields: Readonly<Record<string, Float64Array>>,
  coordinates: readonly Float64Array[],
  weights: readonly Float64Array[],
  t: number | null,
): number {
  if (problem.functional !== null) {
    const point = { coordinates, t, parameters: parameterValues(problem), fields };
    return integrate(evaluateOnGrid(integrand(problem, problem.functional), point).values, weights, false);
  }
  return Object.values(fields).reduce((sum, values) => sum + integrate(values, weights, true), 0);
}

/**
 * The functional of the exact solution at the last output time, by composite 16-point Gauss quadrature.
 *
 * @returns null where a scored field is complex
 * @example exactFunctional(problem)
 * @see Davis and Rabinowitz 1984, section 2.7
 */
export function exactFunctional(problem: ProblemDefinition): number | null {
  const t = problem.classification.isSteady ? null : problem.outputTimes[problem.outputTimes.length - 1];
  const panels = exactPanels[problem.axes.length === 1 ? 1 : 2];
  const rules = problem.axes.map(({ a, b }) => {
    const edges = Float64Array.from({ length: panels + 1 }, (_, p) => a + ((b - a) * p) / panels);
    return gaussPanels(edges, 16);
  });
  const coordinates = rules.map(({ points }) => points);
  const fields: Record<string, Float64Array> = {};
  for (const field of problem.fields) {
    if (!field.isScored) continue;
    const exact = evaluateExact(problem, field.name, t, coordinates);
    if (exact.imaginary) return null;
    fields[field.name] = exact.values;
  }
  return functionalOf(
    problem,
    fields,
    coordinates,
    rules.map((rule) => rule.weights),
    t,
  );
}
