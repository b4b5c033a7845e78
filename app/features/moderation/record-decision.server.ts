import type { Transaction } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import type { DecisionKind, SubmissionState } from "@/drizzle/enums";
import { decisions } from "@/drizzle/schema";
import { recordAuditEvent } from "./record-audit-event.server";

const actions: Record<DecisionKind, string> = {
  list: "submission.listed",
  return: "submission.returned",
  withdraw: "submission.withdrawn",
};

export interface Decision {
  submissionId: string;
  kind: DecisionKind;
  note: string;
  decidedById: string;
  /** The state that the submission has got. */
  state: SubmissionState;
  detail?: Record<string, unknown>;
}

/**
 * The decision, its audit event and the news of it, in the transaction that changes the state. The audit log, which is
 * kept for good, refers to the decision instead of repeating its note: a note may hold names.
 */
export async function recordDecision(tx: Transaction, decision: Decision): Promise<void> {
  const { submissionId, kind, note, decidedById, state, detail } = decision;
  const [written] = await tx
    .insert(decisions)
    .values({ submissionId, kind, note, decidedById })
    .returning({ id: decisions.id });
  await recordAuditEvent(tx, {
    actorId: decidedById,
    action: actions[kind],
    subjectKind: "submission",
    subjectId: submissionId,
    detail: { ...detail, decisionId: written.id },
  });
  await publish(tx, { submissionId, kind: "state", state });
}
