/**
 * The rule that judges a refinement study: the kind of convergence, its order, and its tail.
 *
 * On logarithmic paper the order is p = d ln(1/E) / d ln s. Exponential decay E = exp(-q s) has p = ln(1/E): the order
 * grows as the level does. Algebraic decay keeps its order while ln(1/E) grows, so it falls ever further below it.
 * Comparing the two separates the kinds without fitting either model; the fits only confirm. A label is given only
 * where the evidence is one-sided; otherwise the study is undecided.
 */

import { fitLine, observedOrder, wideOrder } from "./observed-order";
import { classifyTail, findTailStart, isAtFloorEverywhere, type TailKind } from "./study-tail";

/** An order that no listed difference scheme shows before its range; the declared order + 0.75 if larger. */
const fastOrder = 8.5;
/** The same where only part of the study shows it; `fastOrder` + 1.5 if larger. */
const fastOrderOfPart = 10;
/** Fast also means: an order of at least this share of ln(1/E). */
const fastShare = 0.55;

/**
 * Working precisions that the rule takes for the two number types.
 *
 * @example judgeStudy(s, errors, workingPrecision.float64, null)
 * @see IEEE 754-2019: 2^-52 and 2^-23
 */
export const workingPrecision = { float64: 2.22e-16, float32: 1.19e-7 } as const;

/** What the rule says of a study. Indices count runs from coarse to fine. */
export interface StudyJudgement {
  kind: "algebraic" | "exponential" | "mixed" | "undecided" | "floor";
  order: number | null;
  /** First run of the window that shows the order, and one past its last. */
  window: [number, number] | null;
  tail: { start: number; kind: TailKind } | null;
}

/** An order into run `into` from the run `from` coarser by a wide ratio. */
interface WidePair {
  into: number;
  order: number;
  from: number;
}

const level = (error: number) => Math.log(1 / Math.min(error, 0.99));
const logs = (values: readonly number[]) => values.map((value) => Math.log(value));

function widePairs(s: readonly number[], errors: readonly number[]): WidePair[] {
  const pairs: WidePair[] = [];
  for (let k = 1; k < errors.length; k++) {
    const wide = wideOrder(s, errors, k);
    if (wide) pairs.push({ into: k, ...wide });
  }
  return pairs;
}

/** True where the runs about the middle part the window into two stretches of one steady order. */
function isSteady(a: readonly number[], b: readonly number[]): boolean {
  const v = a.length;
  const span = a[v - 1] / a[0];
  const middle = Math.sqrt(a[0] * a[v - 1]);
  let below = -1;
  let above = -1;
  for (let i = 1; i < v - 1; i++) {
    if (a[i] <= middle * 1.0001) below = i;
    if (above < 0 && a[i] >= middle / 1.0001) above = i;
  }
  for (const i of [below, above]) {
    if (i < 0) continue;
    const first = (b[0] - b[i]) / Math.log(a[i] / a[0]);
    const second = (b[i] - b[v - 1]) / Math.log(a[v - 1] / a[i]);
    if (first <= 0 || second <= 0.4 || second < (first > 4 ? 0.85 : 0.6) * first) return false;
    if (Math.log(second / first) > 0.2 * Math.log(span)) return false;
  }
  return true;
}

/** The widest window of the finest runs that is straight in (ln s, ln E). */
function findStraightEnd(
  s: readonly number[],
  errors: readonly number[],
  fast: number,
  wides: readonly WidePair[],
): { runs: number; order: number } | null {
  const m = errors.length;
  if (errors[m - 1] > 0.03) return null;
  for (let v = m; v > 2; v--) {
    const a = s.slice(-v);
    const b = logs(errors.slice(-v));
    if (a[v - 1] / a[0] < (v === 3 ? 2 : 1.3)) return null;
    if (!isSteady(a, b) || wides.some((pair) => pair.order >= fast && pair.from >= m - v)) continue;
    const algebraic = fitLine(logs(a), b);
    const exponential = fitLine(a, b);
    const high = level(errors[m - 1]);
    const isStraight =
      (4 * algebraic.residual <= exponential.residual && algebraic.fall <= fastShare * high) ||
      (v > 3 && algebraic.residual < exponential.residual && algebraic.fall <= 0.35 * high);
    if (!isStraight) continue;
    if (v === 3 && m > 3 && observedOrder(s, errors, m - 4, m - 3) < 0.6 * algebraic.fall) continue;
    const finest = wideOrder(a, errors.slice(-v), v - 1);
    return { runs: v, order: finest ? finest.order : algebraic.fall };
  }
  return null;
}

/** The order of the finest run where a fit against s beats the one against ln s by far. */
function fitFastDecay(
  s: readonly number[],
  errors: readonly number[],
  least: number,
): { order: number; run: number } | null {
  const m = errors.length;
  const finest = wideOrder(s, errors, m - 1);
  if (!finest || finest.order < Math.max(6, least)) return null;
  for (let v = m; v > 3; v--) {
    const y = logs(errors.slice(-v));
    if (50 * fitLine(s.slice(-v), y).residual <= fitLine(logs(s.slice(-v)), y).residual) {
      return { order: finest.order, run: m - 1 };
    }
  }
  return null;
}

/** A decay faster than algebraic: its order and the run that shows it. s1 and errors1 hold one run of the tail too. */
function findFastDecay(
  [s, errors]: [readonly number[], readonly number[]],
  [s1, errors1]: [readonly number[], readonly number[]],
  limits: { fast: number; fastOfPart: number; mayFit: boolean; fitFrom: number },
): { order: number; run: number } | null {
  const m = errors.length;
  const wides = widePairs(s1, errors1);
  const quick = wides.filter(
    (pair) => pair.order >= limits.fast && pair.order >= fastShare * level(errors1[pair.into]),
  );
  if (m >= 2 && quick.length > 0) {
    const toTheEnd = quick.filter((pair) => pair.into >= m - 1);
    if (toTheEnd.length > 0) return { order: Math.max(...toTheEnd.map((pair) => pair.order)), run: m - 1 };
    const last = quick[quick.length - 1];
    return last.into >= 2 && last.order >= limits.fastOfPart ? { order: last.order, run: last.into } : null;
  }
  if (m >= 4 && wides.length === 0) {
    const order = observedOrder(s, errors, 0, m - 1);
    if (order >= limits.fastOfPart && order >= fastShare * level(errors[m - 1])) return { order, run: m - 1 };
  }
  if (m >= 4 && limits.mayFit && errors[m - 1] <= 1e-3) return fitFastDecay(s, errors, limits.fitFrom);
  return null;
}

/**
 * Judges a refinement study by its relative errors.
 *
 * @param s intervals of each run, coarse to fine
 * @param errors relative errors of each run
 * @param eps working precision, see `workingPrecision`
 * @param formal declared order of accuracy, null where none is declared
 * @returns kind, order, window and tail; an undecided study has no order
 * @throws RangeError where the two lists differ in length
 * @example judgeStudy([16, 32, 64], [4e-3, 1e-3, 2.5e-4], workingPrecision.float64, 2).kind // "algebraic"
 * @see the page /scoring, where the rule and how it was measured are written out
 */
export function judgeStudy(
  s: readonly number[],
  errors: readonly number[],
  eps: number = workingPrecision.float64,
  formal: number | null = null,
): StudyJudgement {
  if (s.length !== errors.length) {
    throw new RangeError(`A study needs one error for each run: ${s.length} runs, ${errors.length} errors`);
  }
  const E = errors.map((error) => Math.max(error, 1e-300));
  const m = E.length;
  const undecided: StudyJudgement = { kind: "undecided", order: null, window: null, tail: null };
  if (m === 0) return undecided;
  if (isAtFloorEverywhere(s, E, eps))
    return { ...undecided, kind: "floor", tail: { start: 0, kind: "floor" } };
  const start = findTailStart(s, E, eps);
  const tail = start < m ? { start, kind: classifyTail(s, E, start, eps) } : null;
  if (start < 2) return { ...undecided, tail };
  return { ...judgeBody(s, E, { eps, formal: formal ?? 0, start, tailKind: tail?.kind ?? null }), tail };
}

/** The judgement of the runs before the tail. */
function judgeBody(
  s: readonly number[],
  errors: readonly number[],
  known: { eps: number; formal: number; start: number; tailKind: TailKind | null },
): StudyJudgement {
  const { eps, formal, start, tailKind } = known;
  const fast = Math.max(fastOrder, formal + 0.75);
  const fastOfPart = Math.max(fastOrderOfPart, fast + 1.5);
  const before = errors.slice(0, start);
  // From the largest error on; trailing runs at round-off are left out.
  const first = before.indexOf(Math.max(...before));
  let last = start;
  while (last - first > 2 && errors[last - 1] < 10 * eps) last--;
  const a = s.slice(first, last);
  const e = errors.slice(first, last);
  const a1 = s.slice(first, Math.min(start + 1, errors.length));
  const e1 = errors.slice(first, Math.min(start + 1, errors.length));
  const straight = e.length > 2 ? findStraightEnd(a, e, fast, widePairs(a1, e1)) : null;
  if (straight) {
    const b = e.length - straight.runs;
    const head: [number[], number[]] = [a.slice(0, b + 1), e.slice(0, b + 1)];
    const limits = { fast: fastOfPart, fastOfPart, mayFit: false, fitFrom: 0 };
    const isMixed = b >= 2 && straight.order <= fast && findFastDecay(head, head, limits) !== null;
    const kind = isMixed ? "mixed" : "algebraic";
    return { kind, order: straight.order, window: [first + b, last], tail: null };
  }
  const mayFit = tailKind === null || tailKind === "floor";
  const quick = findFastDecay([a, e], [a1, e1], { fast, fastOfPart, mayFit, fitFrom: formal + 0.75 });
  if (!quick) return { kind: "undecided", order: null, window: null, tail: null };
  const kind = e.length - 1 - quick.run >= 2 ? "mixed" : "exponential";
  return { kind, order: quick.order, window: [first, first + quick.run + 1], tail: null };
}
