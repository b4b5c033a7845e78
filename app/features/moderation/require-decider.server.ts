import { forbidden } from "@/app/platform/errors";
import type { Account, Viewer } from "../accounts/viewer";
import { requireRole, requireScope } from "../accounts/viewer-policy";
import { findGuarded } from "../submissions/find-guarded.server";
import { isOwnTeam } from "../submissions/submission-policy";

/** An admin who is not of the submission's team, and the submission. */
export async function requireDecider(viewer: Viewer, submissionId: string) {
  const account: Account = requireRole(viewer, "admin");
  requireScope(viewer, "review");
  const guarded = await findGuarded(viewer, submissionId);
  if (isOwnTeam(viewer, guarded)) {
    throw forbidden("Nobody decides on a submission of their own team. Another admin has to.");
  }
  return { account, guarded };
}
