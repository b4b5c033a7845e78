import type { CompiledExpression } from "./compile-expression";
import { type EvaluationPlan, planEvaluation } from "./evaluation-plan";
import { binaryFunctions, isBinary, isUnary, type Operation, unaryFunctions } from "./operation";
import { type Operand, runOperation, type Scratch } from "./run-operation";

/** Values in a block: a few arrays of this length fit the processor's nearest cache. */
const longestBlock = 1024;

export interface GridPoint {
  /** Ascending nodes of each axis, in the order of the expression's axes. */
  coordinates: readonly Float64Array[];
  /** Null where nothing depends on time. */
  t?: number | null;
  /** Values of the other scalars by name. */
  parameters?: Readonly<Record<string, number>>;
  /** Values at every node, row-major, of what the expression calls fields; "im u" for an imaginary part. */
  fields?: Readonly<Record<string, Float64Array>>;
}

/** Values on a tensor grid, row-major with the first axis slowest; `imaginary` null where all are real. */
export interface GridValues {
  values: Float64Array;
  imaginary: Float64Array | null;
}

/**
 * Evaluate a compiled expression at every node of a tensor grid.
 *
 * Steps that change along one axis alone are carried out once for that axis; the others run over rows of the last
 * axis in blocks of 1,024 values, so that what they hold stays in the processor's nearest cache.
 *
 * @param compiled from `compileExpression`
 * @param point nodes of each axis, time and parameters
 * @param out optional, written to and returned: product of the axes' lengths
 * @param output which of several outputs
 * @returns values, row-major, first axis slowest
 * @throws RangeError where an axis, a parameter or a field is missing or of the wrong length
 * @example evaluateOnGrid(compiled, { coordinates: [x], t: 3, parameters: { c: 1 } }).values
 * @see C. R. Harris et al., Array programming with NumPy, Nature 585 (2020) 357-362 (what broadcasting computes)
 */
export function evaluateOnGrid(
  compiled: CompiledExpression,
  point: GridPoint,
  out?: { values: Float64Array; imaginary?: Float64Array | null },
  output = 0,
): GridValues {
  const nodes = checkGrid(compiled, point);
  const { re, im } = compiled.outputs[output];
  const values = out?.values ?? new Float64Array(nodes);
  if (values.length !== nodes) {
    throw new RangeError(`the output has room for ${values.length} values; the grid has ${nodes} nodes`);
  }
  evaluatePart(planEvaluation(compiled, re), point, values);
  if (im === null) return { values, imaginary: null };
  const imaginary = out?.imaginary ?? new Float64Array(nodes);
  evaluatePart(planEvaluation(compiled, im), point, imaginary);
  return { values, imaginary };
}

/**
 * The value of a compiled expression that depends on scalars alone, or at one point.
 *
 * @param values by name: scalars, and one number for each axis
 * @throws RangeError where a name has no value
 * @example evaluateAtPoint(compiled, { x: 0.5, t: 0 })
 * @see compileExpression
 */
export function evaluateAtPoint(
  compiled: CompiledExpression,
  values: Readonly<Record<string, number>>,
): number {
  const coordinates = compiled.axes.map((axis) => Float64Array.of(needed(values, axis)));
  return evaluateOnGrid(compiled, { coordinates, t: values.t ?? null, parameters: values }).values[0];
}

function checkGrid(compiled: CompiledExpression, point: GridPoint): number {
  if (point.coordinates.length !== compiled.axes.length) {
    const found = point.coordinates.length;
    throw new RangeError(
      `the expression has ${compiled.axes.length} axes; coordinates of ${found} were given`,
    );
  }
  return point.coordinates.reduce((product, axis) => product * axis.length, 1);
}

function needed(values: Readonly<Record<string, number>>, name: string): number {
  const value = values[name];
  if (value === undefined) throw new RangeError(`the expression needs a value of "${name}"; none was given`);
  return value;
}

function evaluatePart(plan: EvaluationPlan, point: GridPoint, out: Float64Array): void {
  const { coordinates } = point;
  const operands: Operand[] = new Array<Operand>(plan.operations.length);
  for (const index of plan.scalars) operands[index] = scalarOperand(plan.operations[index], operands, point);
  for (const { index, axis } of plan.alongOneAxis) {
    operands[index] = {
      array: alongAxis(plan.operations[index], operands, coordinates[axis]),
      at: 0,
      value: NaN,
    };
  }
  const result = operands[plan.output];
  if (result) spread(result, plan.operations[plan.output].axes, coordinates, out);
  else new RowEvaluation(plan, operands, point, out).run();
}

function scalarOperand(operation: Operation, operands: readonly Operand[], point: GridPoint): Operand {
  return { array: null, at: 0, value: scalarValue(operation, operands, point) };
}

function scalarValue(operation: Operation, operands: readonly Operand[], point: GridPoint): number {
  const { name } = operation;
  if (name === "constant") return operation.value;
  if (name === "variable") {
    if (operation.variable === "t" && typeof point.t === "number") return point.t;
    return needed(point.parameters ?? {}, operation.variable);
  }
  if (name === "select") {
    return operands[operands[operation.test].value !== 0 ? operation.then : operation.otherwise].value;
  }
  if (isUnary(name)) return unaryFunctions[name](operands[(operation as { a: number }).a].value);
  if (isBinary(name)) {
    const { a, b } = operation as { a: number; b: number };
    return binaryFunctions[name](operands[a].value, operands[b].value);
  }
  throw new RangeError("a derivative has no value on a grid; it needs the Taylor evaluation");
}

function alongAxis(operation: Operation, operands: readonly Operand[], nodes: Float64Array): Float64Array {
  if (operation.name === "variable") return nodes;
  const out = new Float64Array(nodes.length);
  runOperation(operation, operands, out, 0, nodes.length, makeScratch(nodes.length));
  return out;
}

/** The output does not change along every axis: repeat it along the others. */
function spread(value: Operand, axes: number, coordinates: readonly Float64Array[], out: Float64Array): void {
  const { array } = value;
  if (!array) {
    out.fill(value.value);
    return;
  }
  const rowLength = coordinates[1].length;
  for (let row = 0; row < coordinates[0].length; row++) {
    if (axes === 1) out.fill(array[row], row * rowLength, (row + 1) * rowLength);
    else out.set(array, row * rowLength);
  }
}

function makeScratch(length: number): Scratch {
  return [new Float64Array(length), new Float64Array(length), new Float64Array(length)];
}

/** Runs the steps at every node, row by row of the last axis and block by block of a row. */
class RowEvaluation {
  private readonly rowLength: number;
  private readonly blockLength: number;
  /** Operands that read the last axis, the first axis of two, and the whole grid. */
  private readonly alongLast: Operand[] = [];
  private readonly alongFirst: { operand: Operand; values: Float64Array }[] = [];
  private readonly atEveryNode: Operand[] = [];

  constructor(
    private readonly plan: EvaluationPlan,
    private readonly operands: Operand[],
    private readonly point: GridPoint,
    private readonly out: Float64Array,
  ) {
    const last = point.coordinates.length - 1;
    this.rowLength = point.coordinates[last].length;
    this.blockLength = Math.min(longestBlock, this.rowLength);
    for (const { index, axis } of plan.alongOneAxis) this.bindAxis(operands[index], axis === last);
    plan.operations.forEach((operation, index) => this.bindVariable(operation, index));
    const buffers = Array.from({ length: plan.bufferCount }, () => new Float64Array(this.blockLength));
    for (const { index, buffer } of plan.everywhere) {
      operands[index] = { array: buffer < 0 ? out : buffers[buffer], at: 0, value: NaN };
    }
  }

  run(): void {
    const { plan, operands, out, rowLength } = this;
    const scratch = makeScratch(this.blockLength);
    const result = operands[plan.output];
    const isVariable = plan.operations[plan.output].name === "variable";
    for (let rowAt = 0; rowAt < out.length; rowAt += rowLength) {
      for (const { operand, values } of this.alongFirst) operand.value = values[rowAt / rowLength];
      for (let at = 0; at < rowLength; at += this.blockLength) {
        const n = Math.min(this.blockLength, rowLength - at);
        for (const operand of this.alongLast) operand.at = at;
        for (const operand of this.atEveryNode) operand.at = rowAt + at;
        for (const { index, buffer } of plan.everywhere) {
          const target = operands[index].array ?? out;
          runOperation(plan.operations[index], operands, target, buffer < 0 ? rowAt + at : 0, n, scratch);
        }
        if (isVariable && result.array) {
          out.set(result.array.subarray(result.at, result.at + n), rowAt + at);
        }
      }
    }
  }

  /** Along the first of two axes a step has one number for each row. */
  private bindAxis(operand: Operand, isLast: boolean): void {
    if (isLast) this.alongLast.push(operand);
    else if (operand.array) {
      this.alongFirst.push({ operand, values: operand.array });
      operand.array = null;
    }
  }

  private bindVariable(operation: Operation, index: number): void {
    if (operation.name !== "variable" || operation.source === "scalar" || this.operands[index]) return;
    const isField = operation.source === "field";
    const array = isField
      ? this.point.fields?.[operation.variable]
      : this.point.coordinates[operation.source as number];
    const nodes = this.out.length;
    if (isField && array?.length !== nodes) {
      const found = array === undefined ? "none was given" : `${array.length} were given`;
      throw new RangeError(`the expression needs ${nodes} values of "${operation.variable}"; ${found}`);
    }
    this.operands[index] = { array: array ?? null, at: 0, value: NaN };
    (isField ? this.atEveryNode : this.alongLast).push(this.operands[index]);
  }
}
