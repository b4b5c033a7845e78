import type { CompiledExpression } from "./compile-expression";
import { isBinary, isUnary, type Operation } from "./operation";

/** Which steps one output needs, and over what each of them runs. */
export interface EvaluationPlan {
  operations: readonly Operation[];
  output: number;
  /** Steps with one value for the whole grid. */
  scalars: readonly number[];
  /** Steps carried out once along the axis that they depend on. */
  alongOneAxis: readonly { index: number; axis: number }[];
  /** Steps carried out at every node; each writes a buffer, the last one (-1) the output itself. */
  everywhere: readonly { index: number; buffer: number }[];
  bufferCount: number;
}

const plans = new WeakMap<CompiledExpression, Map<number, EvaluationPlan>>();

/**
 * Sort the steps that an output needs by the axes they change along, and give buffers to those at every node.
 *
 * Buffers are reused as soon as no later step reads them, which keeps all of them in the nearest cache.
 *
 * @param compiled from `compileExpression`
 * @param output index of a step
 * @returns the plan, kept for the next call
 * @example planEvaluation(compiled, compiled.outputs[0].re)
 * @see M. Poletto and V. Sarkar, Linear scan register allocation, ACM TOPLAS 21 (1999) 895-913
 */
export function planEvaluation(compiled: CompiledExpression, output: number): EvaluationPlan {
  const known = plans.get(compiled) ?? new Map<number, EvaluationPlan>();
  plans.set(compiled, known);
  const found = known.get(output);
  if (found) return found;
  const plan = makePlan(compiled, output);
  known.set(output, plan);
  return plan;
}

/**
 * Indices of the steps that a step reads.
 *
 * @example operandsOf({ name: "sin", a: 3, axes: 1 }) // [3]
 * @see planEvaluation
 */
export function operandsOf(operation: Operation): number[] {
  const { name } = operation;
  if (name === "select") return [operation.test, operation.then, operation.otherwise];
  if (isUnary(name) || name === "derivative") return [(operation as { a: number }).a];
  if (!isBinary(name)) return [];
  const { a, b } = operation as { a: number; b: number };
  return [a, b];
}

function makePlan(compiled: CompiledExpression, output: number): EvaluationPlan {
  const { operations, axes } = compiled;
  const full = (1 << axes.length) - 1;
  const steps = neededSteps(operations, output);
  const scalars = steps.filter((index) => operations[index].axes === 0);
  const everywhere = steps.filter((index) => operations[index].axes === full && full !== 0);
  const isElsewhere = (mask: number) => mask !== 0 && mask !== full;
  const alongOneAxis = steps
    .filter((index) => isElsewhere(operations[index].axes))
    .map((index) => ({ index, axis: operations[index].axes === 1 ? 0 : 1 }));
  const computed = everywhere.filter((index) => operations[index].name !== "variable");
  const allocation = allocateBuffers(operations, computed, output);
  return { operations, output, scalars, alongOneAxis, ...allocation };
}

function neededSteps(operations: readonly Operation[], output: number): number[] {
  const isNeeded = new Set([output]);
  for (let index = output; index >= 0; index--) {
    if (isNeeded.has(index)) operandsOf(operations[index]).forEach((operand) => isNeeded.add(operand));
  }
  return [...isNeeded].sort((a, b) => a - b);
}

function allocateBuffers(operations: readonly Operation[], computed: number[], output: number) {
  const lastUse = new Map<number, number>();
  for (const index of computed)
    for (const operand of operandsOf(operations[index])) lastUse.set(operand, index);
  const bufferOf = new Map<number, number>();
  const free: number[] = [];
  let bufferCount = 0;
  const everywhere = computed.map((index) => {
    // An operand's buffer may be overwritten in place: every kernel reads a value before it writes the same place.
    for (const operand of new Set(operandsOf(operations[index]))) {
      const buffer = bufferOf.get(operand);
      if (buffer !== undefined && lastUse.get(operand) === index) free.push(buffer);
    }
    if (index === output) return { index, buffer: -1 };
    const buffer = free.pop() ?? bufferCount++;
    bufferOf.set(index, buffer);
    return { index, buffer };
  });
  return { everywhere, bufferCount };
}
