import type { SubmissionSummary } from "@/app/features/submissions/submission-view";
import type { Verdict } from "@/benchmarks/scoring/result";

export const verdictNames: Record<Verdict, string> = {
  confirmed: "confirmed",
  near: "near",
  below: "below",
  above: "above",
  notExponential: "not exponential",
  undecidable: "undecidable",
  none: "no claim",
};

/** "algebraic, order 4.00, verdict confirmed". */
export function observedSentence({
  kind,
  order,
  rate,
  verdict,
}: NonNullable<SubmissionSummary["observed"]>): string {
  const figure =
    order !== null
      ? `order ${order.toFixed(2)}`
      : rate !== null
        ? `rate ${rate.toPrecision(3)} a node`
        : null;
  const kindText = kind === "none" ? "no kind of convergence" : kind;
  return [kindText, figure, `verdict ${verdictNames[verdict]}`].filter(Boolean).join(", ");
}
