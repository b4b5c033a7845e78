import { kindNames, verdictNames } from "@/app/components/instrument/ranking-words";
import type { SubmissionSummary } from "@/app/features/submissions/submission-view";

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
  return [kindNames[kind], figure, `verdict ${verdictNames[verdict]}`].filter(Boolean).join(", ");
}
