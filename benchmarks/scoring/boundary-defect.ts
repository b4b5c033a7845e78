/** How far a run misses the boundary conditions. */

import { compileExpression } from "../expressions/compile-expression";
import { evaluateOnGrid } from "../expressions/evaluate-on-grid";
import {
  barycentricWeights,
  polynomialSlopeWeights,
  polynomialValueWeights,
} from "../interpolation/barycentric";
import { fornbergWeights } from "../interpolation/fornberg-weights";
import type { GridValues } from "../norms/error-norms";
import type { BoundaryCondition, ProblemDefinition } from "../problems/definition";
import { contextOf, parameterValues } from "../problems/problem-context";
import { cellEdges } from "../quadrature/cell-widths";
import type { Declaration } from "./declaration";
import type { RunAxis, RunFields } from "./read-run";
import type { RunScore } from "./result";

/** Weights of the values nearest an end: `first` is the index of the first node they apply to. */
interface EndStencil {
  first: number;
  value: Float64Array;
  slope: Float64Array;
}

/** One-sided differences of 6th order take seven nodes. */
const oneSidedNodes = 7;

/** Value and slope at an end from cell averages: derivatives of the primitive, which is known at the cells' edges. */
function stencilOfAverages(axis: RunAxis, at: number, isLeft: boolean): EndStencil {
  const edges = cellEdges(axis.nodes, axis.a, axis.b, axis.isPeriodic);
  const cells = Math.min(oneSidedNodes, axis.n);
  const first = isLeft ? 0 : axis.n - cells;
  const local = edges.slice(first, first + cells + 1);
  const onCells = (derivative: number) => {
    const onEdges = fornbergWeights(derivative, at, local);
    const weights = new Float64Array(cells);
    let above = 0;
    for (let j = cells - 1; j >= 0; j--) {
      above += onEdges[j + 1];
      weights[j] = above * (local[j + 1] - local[j]);
    }
    return weights;
  };
  return { first, value: onCells(1), slope: onCells(2) };
}

function stencilAt(axis: RunAxis, end: "a" | "b", declaration: Declaration): EndStencil {
  const isLeft = end === "a";
  const at = isLeft ? axis.a : axis.b;
  if (declaration.values === "cellAverage") return stencilOfAverages(axis, at, isLeft);
  const reconstruction = declaration.reconstruction;
  if (reconstruction?.kind === "polynomial") {
    const barycentric = barycentricWeights(axis.kind, axis.nodes);
    const value = polynomialValueWeights(axis.nodes, barycentric, at);
    return { first: 0, value, slope: polynomialSlopeWeights(axis.nodes, barycentric, at) };
  }
  const wanted = reconstruction?.kind === "piecewise-polynomial" ? reconstruction.degree + 1 : oneSidedNodes;
  const count = Math.min(Math.max(wanted, 2), axis.n);
  const first = isLeft ? 0 : axis.n - count;
  const nodes = axis.nodes.slice(first, first + count);
  return { first, value: fornbergWeights(0, at, nodes), slope: fornbergWeights(1, at, nodes) };
}

/** An expression of a condition along an end: one value for each node of the other axis, or one in 1-D. */
function alongEnd(
  problem: ProblemDefinition,
  text: string,
  t: number | null,
  coordinates: Float64Array[],
): GridValues {
  return evaluateOnGrid(compileExpression(text, contextOf(problem)), {
    coordinates,
    t,
    parameters: parameterValues(problem),
  });
}

/** alpha u + beta du/dn - g for one part (real or imaginary) of u, at one place of the end. */
function applyStencil(part: Float64Array, start: number, step: number, weights: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < weights.length; k++) sum += weights[k] * part[start + k * step];
  return sum;
}

function largestResidual(
  problem: ProblemDefinition,
  condition: BoundaryCondition,
  run: RunFields,
  u: GridValues,
  declaration: Declaration,
): number {
  const index = run.axes.findIndex((axis) => axis.name === condition.axis);
  const axis = run.axes[index];
  const t = run.times[run.times.length - 1];
  const coordinates = run.axes.map((one, i) =>
    i === index ? Float64Array.of(condition.end === "a" ? axis.a : axis.b) : one.nodes,
  );
  const alpha = alongEnd(problem, condition.alpha, t, coordinates).values;
  const beta = alongEnd(problem, condition.beta, t, coordinates).values;
  const g = alongEnd(problem, condition.g, t, coordinates);
  const stencil = stencilAt(axis, condition.end, declaration);
  const outward = condition.end === "a" ? -1 : 1;
  const columns = run.axes.length === 2 ? run.axes[1].n : 1;
  const step = run.axes.length === 2 && index === 0 ? columns : 1;
  const along = index === 0 ? 1 : columns;
  let largest = 0;
  for (let i = 0; i < alpha.length; i++) {
    const start = i * along + stencil.first * step;
    const residualOf = (part: Float64Array, target: number) => {
      const slope = beta[i] === 0 ? 0 : applyStencil(part, start, step, stencil.slope);
      const value = alpha[i] === 0 ? 0 : applyStencil(part, start, step, stencil.value);
      return alpha[i] * value + beta[i] * outward * slope - target;
    };
    const real = residualOf(u.values, g.values[i]);
    const imaginary = u.imaginary ? residualOf(u.imaginary, g.imaginary?.[i] ?? 0) : 0;
    largest = Math.max(largest, Math.hypot(real, imaginary));
  }
  return largest;
}

/**
 * The residual of each boundary condition of the scored fields at the last output time.
 *
 * Ends that are not nodes, and derivatives, use the declared reconstruction; where none is declared, one-sided
 * formulas through seven nodes (6th-order differences), or as many as there are. In 2-D it is the largest residual
 * along the side.
 *
 * @returns one residual for each condition, |alpha u + beta du/dn - g|, in the condition's own unit
 * @example boundaryDefects(problem, run, declaration)[0].residual
 * @see Fornberg 1988 (one-sided differences); Berrut and Trefethen 2004 (polynomial reconstruction)
 */
export function boundaryDefects(
  problem: ProblemDefinition,
  run: RunFields,
  declaration: Declaration,
): RunScore["boundary"] {
  const defects: RunScore["boundary"] = [];
  for (const condition of problem.boundaryConditions) {
    const field = run.fields.find((one) => one.name === condition.field);
    if (!field) continue;
    const u = field.times[field.times.length - 1];
    const residual = largestResidual(problem, condition, run, u, declaration);
    const { axis, end, kind } = condition;
    defects.push({ axis, end, kind, residual });
  }
  return defects;
}
