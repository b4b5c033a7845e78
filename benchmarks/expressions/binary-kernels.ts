import { type BinaryName, modulo } from "./operation";

/** out[i] = f(a[i], b[i]) over n values from the three offsets. */
export type BinaryKernel = (
  out: Float64Array,
  outAt: number,
  a: Float64Array,
  aAt: number,
  b: Float64Array,
  bAt: number,
  n: number,
) => void;

/** out[i] = f(a[i], s) or f(s, a[i]) for a number s. */
export type ScaledKernel = (
  out: Float64Array,
  outAt: number,
  a: Float64Array,
  aAt: number,
  s: number,
  n: number,
) => void;

/** Both operands change from node to node. */
export const binaryKernels: Record<BinaryName, BinaryKernel> = {
  add: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] + b[bAt + i];
  },
  sub: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] - b[bAt + i];
  },
  mul: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] * b[bAt + i];
  },
  div: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] / b[bAt + i];
  },
  pow: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.pow(a[aAt + i], b[bAt + i]);
  },
  atan2: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.atan2(a[aAt + i], b[bAt + i]);
  },
  min: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.min(a[aAt + i], b[bAt + i]);
  },
  max: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.max(a[aAt + i], b[bAt + i]);
  },
  mod: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = modulo(a[aAt + i], b[bAt + i]);
  },
  less: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] < b[bAt + i] ? 1 : 0;
  },
  lessOrEqual: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] <= b[bAt + i] ? 1 : 0;
  },
  equal: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] === b[bAt + i] ? 1 : 0;
  },
  unequal: (out, outAt, a, aAt, b, bAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] === b[bAt + i] ? 0 : 1;
  },
};

/** The second operand is one number. */
export const rightScaledKernels: Partial<Record<BinaryName, ScaledKernel>> = {
  add: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] + s;
  },
  sub: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] - s;
  },
  mul: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] * s;
  },
  div: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = a[aAt + i] / s;
  },
  pow: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.pow(a[aAt + i], s);
  },
  min: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.min(a[aAt + i], s);
  },
  max: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.max(a[aAt + i], s);
  },
  mod: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = modulo(a[aAt + i], s);
  },
};

/** The first operand is one number. */
export const leftScaledKernels: Partial<Record<BinaryName, ScaledKernel>> = {
  add: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = s + a[aAt + i];
  },
  sub: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = s - a[aAt + i];
  },
  mul: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = s * a[aAt + i];
  },
  div: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = s / a[aAt + i];
  },
  pow: (out, outAt, a, aAt, s, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.pow(s, a[aAt + i]);
  },
};
