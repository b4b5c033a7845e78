import { and, eq } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import { conflict } from "@/app/platform/errors";
import type { SubmissionState } from "@/drizzle/enums";
import { decisions, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireNote } from "./decision-form";
import { recordAuditEvent } from "./record-audit-event.server";
import { requireDecider } from "./require-decider.server";

/** Gives a submission back to its team with a note; it may be handed in again. */
export async function returnSubmission(
  viewer: Viewer,
  input: { id: string; note: string },
): Promise<{ id: string; state: SubmissionState }> {
  const { account, guarded } = await requireDecider(viewer, input.id);
  const note = requireNote(input.note);
  return await db.transaction(async (tx) => {
    const [returned] = await tx
      .update(submissions)
      .set({ state: "returned" })
      .where(and(eq(submissions.id, guarded.id), eq(submissions.state, "inReview")))
      .returning({ id: submissions.id, state: submissions.state });
    if (!returned) throw conflict("The submission is not in review any more: somebody else has decided.");
    await tx
      .insert(decisions)
      .values({ submissionId: guarded.id, kind: "return", note, decidedById: account.userId });
    await recordAuditEvent(tx, {
      actorId: account.userId,
      action: "submission.return",
      subjectKind: "submission",
      subjectId: guarded.id,
      detail: { note },
    });
    await publish(tx, { submissionId: guarded.id, kind: "state", state: returned.state });
    return returned;
  });
}
