/** The verdict on what an author claims about the convergence of a method. */

import { judgeStudy } from "./judge-study";
import { wideOrder } from "./observed-order";

/** Verdicts on a claim; `none` where nothing is claimed. */
export type ClaimVerdict =
  "confirmed" | "near" | "below" | "above" | "notExponential" | "undecidable" | "none";

/**
 * Judges a claim of algebraic or exponential convergence. Missing evidence never becomes a pass, and a fail needs a
 * settled end.
 *
 * @param s intervals of each run, coarse to fine
 * @param errors relative errors of each run
 * @param eps working precision
 * @param claim what is claimed; `none` answers `none`
 * @example judgeClaim([16, 32, 64], [4e-3, 1e-3, 2.5e-4], 2.22e-16, { kind: "algebraic", order: 2 }) // "confirmed"
 * @see the page /scoring, where the rule is written out
 */
export function judgeClaim(
  s: readonly number[],
  errors: readonly number[],
  eps: number,
  claim: { kind: "algebraic"; order: number } | { kind: "exponential" } | { kind: "none" },
): ClaimVerdict {
  if (claim.kind === "none") return "none";
  const formal = claim.kind === "algebraic" ? claim.order : null;
  const { kind, tail } = judgeStudy(s, errors, eps, formal);
  if (claim.kind === "exponential") {
    if (kind === "exponential") return "confirmed";
    return kind === "undecided" || kind === "floor" ? "undecidable" : "notExponential";
  }
  let end = tail ? tail.start : errors.length;
  while (end > 2 && errors[end - 1] < 10 * eps) end--;
  if (end < 3) return "undecidable";
  const fine = wideOrder(s, errors, end - 1);
  if (!fine) return "undecidable";
  const before = wideOrder(s, errors, fine.from) ?? wideOrder(s, errors, end - 2);
  if (!before) return "undecidable";
  const offFine = Math.abs(fine.order - claim.order);
  const offBefore = Math.abs(before.order - claim.order);
  if (offFine <= 0.2 && offBefore <= 0.5) return "confirmed";
  if (offFine <= 0.5 && offBefore <= 1) return "near";
  const isSettled = Math.abs(fine.order - before.order) <= Math.max(0.2, 0.1 * Math.abs(fine.order));
  if ((kind === "algebraic" || kind === "mixed") && isSettled) {
    return fine.order < claim.order ? "below" : "above";
  }
  return "undecidable";
}
