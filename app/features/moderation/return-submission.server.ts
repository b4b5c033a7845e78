import { and, eq } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { conflict } from "@/app/platform/errors";
import type { SubmissionState } from "@/drizzle/enums";
import { submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireNote } from "./decision-form";
import { recordDecision } from "./record-decision.server";
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
    await recordDecision(tx, {
      submissionId: guarded.id,
      kind: "return",
      note,
      decidedById: account.userId,
      state: returned.state,
    });
    return returned;
  });
}
