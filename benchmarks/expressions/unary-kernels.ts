import { erf, erfc } from "./error-function";
import type { UnaryName } from "./operation";

/** out[i] = f(a[i]) over n values from the two offsets. */
export type UnaryKernel = (out: Float64Array, outAt: number, a: Float64Array, aAt: number, n: number) => void;

/**
 * One loop for each function: with the function named in the loop the engine compiles it in place, while a loop that
 * is handed a function calls it for every value.
 */
export const unaryKernels: Record<UnaryName, UnaryKernel> = {
  neg: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = -a[aAt + i];
  },
  sin: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.sin(a[aAt + i]);
  },
  cos: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.cos(a[aAt + i]);
  },
  tan: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.tan(a[aAt + i]);
  },
  asin: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.asin(a[aAt + i]);
  },
  acos: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.acos(a[aAt + i]);
  },
  atan: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.atan(a[aAt + i]);
  },
  sinh: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.sinh(a[aAt + i]);
  },
  cosh: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.cosh(a[aAt + i]);
  },
  tanh: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.tanh(a[aAt + i]);
  },
  sech: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = 1 / Math.cosh(a[aAt + i]);
  },
  exp: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.exp(a[aAt + i]);
  },
  log: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.log(a[aAt + i]);
  },
  sqrt: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.sqrt(a[aAt + i]);
  },
  abs: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.abs(a[aAt + i]);
  },
  sign: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = Math.sign(a[aAt + i]);
  },
  erf: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = erf(a[aAt + i]);
  },
  erfc: (out, outAt, a, aAt, n) => {
    for (let i = 0; i < n; i++) out[outAt + i] = erfc(a[aAt + i]);
  },
};
