import { binaryKernels, leftScaledKernels, rightScaledKernels } from "./binary-kernels";
import { type BinaryName, isUnary, type Operation, type UnaryName } from "./operation";
import { unaryKernels } from "./unary-kernels";

/** What a step reads: a run of values from a place in an array, or one number. */
export interface Operand {
  array: Float64Array | null;
  at: number;
  value: number;
}

/** Room for numbers that a kernel without a scaled form needs as arrays. */
export type Scratch = readonly [Float64Array, Float64Array, Float64Array];

/**
 * Carry out one step on n values.
 *
 * @param operands of all steps, by index
 * @param out written from `outAt` on
 * @param scratch three arrays of n values or more
 * @throws RangeError for a derivative, which has no value on a grid
 * @example runOperation(operation, operands, out, 0, 1024, scratch)
 * @see evaluateOnGrid
 */
export function runOperation(
  operation: Operation,
  operands: readonly Operand[],
  out: Float64Array,
  outAt: number,
  n: number,
  scratch: Scratch,
): void {
  const { name } = operation;
  if (name === "select") {
    const [test, then, otherwise] = [operation.test, operation.then, operation.otherwise].map((index, k) =>
      asArray(operands[index], scratch[k], n),
    );
    runSelect(test, then, otherwise, out, outAt, n);
  } else if (isUnary(name)) {
    const a = operands[(operation as { a: number }).a];
    unaryKernels[name as UnaryName](out, outAt, asArray(a, scratch[0], n).array, a.array ? a.at : 0, n);
  } else if (name === "constant" || name === "variable" || name === "derivative") {
    throw new RangeError(`a step "${name}" cannot be carried out on a grid`);
  } else {
    const { a, b } = operation as { a: number; b: number };
    runBinary(name, operands[a], operands[b], out, outAt, n, scratch);
  }
}

interface Run {
  array: Float64Array;
  at: number;
}

function asArray(operand: Operand, room: Float64Array, n: number): Run {
  if (operand.array) return { array: operand.array, at: operand.at };
  room.fill(operand.value, 0, n);
  return { array: room, at: 0 };
}

function runBinary(
  name: BinaryName,
  a: Operand,
  b: Operand,
  out: Float64Array,
  outAt: number,
  n: number,
  scratch: Scratch,
): void {
  const right = a.array && !b.array ? rightScaledKernels[name] : undefined;
  const left = b.array && !a.array ? leftScaledKernels[name] : undefined;
  if (a.array && right) right(out, outAt, a.array, a.at, b.value, n);
  else if (b.array && left) left(out, outAt, b.array, b.at, a.value, n);
  else {
    const first = asArray(a, scratch[0], n);
    const second = asArray(b, scratch[1], n);
    binaryKernels[name](out, outAt, first.array, first.at, second.array, second.at, n);
  }
}

function runSelect(test: Run, then: Run, otherwise: Run, out: Float64Array, outAt: number, n: number): void {
  for (let i = 0; i < n; i++) {
    out[outAt + i] =
      test.array[test.at + i] !== 0 ? then.array[then.at + i] : otherwise.array[otherwise.at + i];
  }
}
