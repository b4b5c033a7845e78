import type { Finding, Study } from "@/benchmarks/scoring/result";

/** Why a study ranks between the nodes only. */
export type BetweenOnlyReason = "exactAtNodes" | "gapTooWide";

export type DecidingFinding = Pick<Finding, "code" | "severity" | "figures">;

/** The findings that `whyBetweenOnly` looks at. */
export const decidingCodes = ["equals-exact", "wide-gap"];

/**
 * Nodal values that equal u* say nothing where the grid cannot carry u* (some schemes are exact at the nodes by
 * construction), nor where every run equals it. A spectral study that ends in round-off on its finest grids equals u*
 * there too, but got there on grids that resolve it: it keeps its rank at the nodes. A listed grid with a gap above
 * 4L/N can leave out the very place where the error sits.
 */
export function whyBetweenOnly(findings: DecidingFinding[], study: Study): BetweenOnlyReason | null {
  const exact = findings.find((finding) => finding.code === "equals-exact");
  if (exact && (exact.severity === "strong" || exact.figures.grids === study.points.length))
    return "exactAtNodes";
  return findings.some((finding) => finding.code === "wide-gap") ? "gapTooWide" : null;
}
