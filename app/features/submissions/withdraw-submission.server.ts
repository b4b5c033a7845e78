import { and, eq } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { conflict, forbidden } from "@/app/platform/errors";
import type { SubmissionState } from "@/drizzle/enums";
import { marks, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireVerified } from "../accounts/viewer-policy";
import { requireNote } from "../moderation/decision-form";
import { recordDecision } from "../moderation/record-decision.server";
import { findGuarded } from "./find-guarded.server";
import { canWithdraw } from "./submission-policy";

/** Takes a record out of the rankings; its page stays, with the note as its notice. */
export async function withdrawSubmission(
  viewer: Viewer,
  input: { id: string; note: string },
): Promise<{ id: string; state: SubmissionState }> {
  const account = requireVerified(viewer);
  const guarded = await findGuarded(viewer, input.id);
  if (!canWithdraw(viewer, { ...guarded, state: "listed" })) {
    throw forbidden("Only the team of a record and admins can withdraw it.");
  }
  const note = requireNote(input.note);
  return await db.transaction(async (tx) => {
    const [withdrawn] = await tx
      .update(submissions)
      .set({ state: "withdrawn" })
      .where(and(eq(submissions.id, guarded.id), eq(submissions.state, "listed")))
      .returning({ id: submissions.id, state: submissions.state });
    if (!withdrawn) throw conflict("Only a listed record can be withdrawn.");
    await tx.update(marks).set({ isListed: false }).where(eq(marks.submissionId, guarded.id));
    await recordDecision(tx, {
      submissionId: guarded.id,
      kind: "withdraw",
      note,
      decidedById: account.userId,
      state: withdrawn.state,
    });
    return withdrawn;
  });
}
