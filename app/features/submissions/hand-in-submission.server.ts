import { and, eq, inArray } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import { conflict, notFound } from "@/app/platform/errors";
import type { SubmissionState } from "@/drizzle/enums";
import { submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { recordAuditEvent } from "../moderation/record-audit-event.server";
import { findGuarded } from "./find-guarded.server";
import { requireSubmitter } from "./receive-submission.server";
import { isOwnTeam } from "./submission-policy";

/** Asks for review of a scored submission, or of a returned one again. */
export async function handInSubmission(
  viewer: Viewer,
  id: string,
): Promise<{ id: string; state: SubmissionState }> {
  const account = requireSubmitter(viewer);
  const guarded = await findGuarded(viewer, id);
  if (!isOwnTeam(viewer, guarded)) throw notFound("The submission");
  return await db.transaction(async (tx) => {
    const [handedIn] = await tx
      .update(submissions)
      .set({ state: "inReview", handedInAt: new Date() })
      .where(and(eq(submissions.id, guarded.id), inArray(submissions.state, ["scored", "returned"])))
      .returning({ id: submissions.id, state: submissions.state });
    if (!handedIn) throw conflict("Only a scored or returned submission can be handed in.");
    await recordAuditEvent(tx, {
      actorId: account.userId,
      action: "submission.handedIn",
      subjectKind: "submission",
      subjectId: guarded.id,
      detail: { from: guarded.state },
    });
    await publish(tx, { submissionId: guarded.id, kind: "state", state: handedIn.state });
    return handedIn;
  });
}
