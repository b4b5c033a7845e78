/** Where the error of a refinement study stops falling, and what stops it. */

import { fitLine, median, observedOrder, wideOrder } from "./observed-order";

/** What the finest runs of a study ended in. */
export type TailKind = "floor" | "stall" | "floorOrStall" | "short";

const logs = (values: readonly number[]) => values.map((value) => Math.log(value));

/**
 * True where every run is at round-off already: small errors that do not fall by refinement.
 *
 * @param s intervals, coarse to fine
 * @param errors relative errors
 * @param eps working precision
 * @example isAtFloorEverywhere([32, 64], [2e-15, 3e-15], 2.22e-16) // true
 * @see the rule that judges a refinement study, on the page /scoring
 */
export function isAtFloorEverywhere(s: readonly number[], errors: readonly number[], eps: number): boolean {
  return (
    median(errors) <= 1e5 * eps &&
    errors[0] <= 1e4 * eps &&
    Math.min(...errors) >= errors[0] / 10 &&
    fitLine(logs(s), logs(errors)).fall <= 0.5
  );
}

/** The steepest wide order seen up to run k. */
function steepestOrder(s: readonly number[], errors: readonly number[], k: number): number {
  const seen: number[] = [];
  for (let i = 1; i <= k; i++) {
    const wide = wideOrder(s, errors, i);
    if (wide) seen.push(wide.order);
  }
  if (seen.length === 0 && k > 0) seen.push(observedOrder(s, errors, 0, k));
  return seen.length > 0 ? Math.max(...seen) : 0;
}

/** True where the finest run alone falls short of what the steepest decay before it promised. */
function isFinestRunShort(s: readonly number[], errors: readonly number[], eps: number): boolean {
  const m = errors.length;
  const steepest = steepestOrder(s, errors, m - 2);
  const step = Math.log(s[m - 1]) - Math.log(s[m - 2]);
  const promised = steepest * step;
  const seen = Math.log(errors[m - 2] / errors[m - 1]);
  if (!(steepest > 0 && promised - seen >= Math.log(4))) return false;
  if (5 * errors[m - 1] > Math.max(...errors.slice(0, -1))) return false;
  if (seen <= Math.min(promised / 4, step / 2)) return true;
  const before = observedOrder(s, errors, m - 3, m - 2) * step;
  return errors[m - 1] <= 1e3 * eps && seen <= 0.6 * Math.min(promised, before);
}

/**
 * The first run of the tail: from there on the error no longer falls as the steepest decay before it promised.
 *
 * @param s intervals, coarse to fine
 * @param errors relative errors
 * @param eps working precision
 * @returns an index, or the number of runs where there is no tail
 * @example findTailStart([8, 16, 32, 64], [1e-2, 1e-6, 1e-14, 1e-14], 2.22e-16) // 2
 * @see the rule that judges a refinement study, on the page /scoring
 */
export function findTailStart(s: readonly number[], errors: readonly number[], eps: number): number {
  const m = errors.length;
  const x = logs(s);
  for (let k = 1; k < m - 1; k++) {
    const tail = errors.slice(k);
    const steepest = steepestOrder(s, errors, k);
    if (steepest <= 0 || errors[k] > 2 * Math.min(...tail)) continue;
    if (5 * median(tail) > Math.max(...errors.slice(0, k))) continue;
    const promised = steepest * (x[m - 1] - x[k]);
    const seen = Math.max(0, Math.log(errors[k] / Math.min(...tail.slice(1))));
    const isShort = promised - seen >= Math.log(4) && seen <= promised / 4;
    if (isShort && fitLine(x.slice(k), logs(tail)).fall <= 0.5) return k;
  }
  return m >= 3 && isFinestRunShort(s, errors, eps) ? m - 1 : m;
}

/**
 * What the tail from run `start` on is: round-off (which may rise with the number of nodes), a stall, one of the two,
 * or one short run alone.
 *
 * @example classifyTail([32, 64], [1e-6, 1e-6], 0, 2.22e-16) // "stall"
 * @see the rule that judges a refinement study, on the page /scoring
 */
export function classifyTail(
  s: readonly number[],
  errors: readonly number[],
  start: number,
  eps: number,
): TailKind {
  const tail = errors.slice(start);
  const middle = median(tail);
  const fall = tail.length > 1 ? fitLine(logs(s.slice(start)), logs(tail)).fall : 0;
  if (middle <= 1e3 * eps || (fall <= -0.7 && middle <= Math.min(1e8 * eps, 1e-3))) return "floor";
  if (middle <= 1e5 * eps) return "floorOrStall";
  return tail.length >= 2 ? "stall" : "short";
}
