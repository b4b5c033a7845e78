import { publicStates, type SubmissionState } from "@/drizzle/enums";
import type { Viewer } from "../accounts/viewer";
import { hasRole, hasScope, isMember } from "../accounts/viewer-policy";
import type { SubmissionPermissions } from "./submission-view";

/** What the rules below need to know of a submission. */
export interface GuardedSubmission {
  state: SubmissionState;
  teamId: string;
}

export function isPublic(state: SubmissionState): boolean {
  return (publicStates as readonly SubmissionState[]).includes(state);
}

export function isOwnTeam(viewer: Viewer, submission: GuardedSubmission): boolean {
  return isMember(viewer, submission.teamId);
}

/** Private to the team and admins before it is listed; maintainers see what is handed in for review. */
export function canSee(viewer: Viewer, submission: GuardedSubmission): boolean {
  if (isPublic(submission.state)) return true;
  if (viewer === null) return false;
  // A CI job's token that may only submit still follows its own submission.
  if (isOwnTeam(viewer, submission)) return hasScope(viewer, "read") || hasScope(viewer, "submit");
  if (!hasScope(viewer, "read") && !hasScope(viewer, "review")) return false;
  return hasRole(viewer, "admin") || (hasRole(viewer, "maintainer") && submission.state === "inReview");
}

/** A withdrawn record keeps its page, figures and checksums; the files go back to the team. */
export function canDownload(viewer: Viewer, submission: GuardedSubmission): boolean {
  if (submission.state !== "withdrawn") return canSee(viewer, submission);
  return hasRole(viewer, "admin") || isOwnTeam(viewer, submission);
}

export function canHandIn(viewer: Viewer, submission: GuardedSubmission): boolean {
  if (viewer === null || !viewer.isEmailVerified || !hasScope(viewer, "submit")) return false;
  return isOwnTeam(viewer, submission) && ["scored", "returned"].includes(submission.state);
}

/** Nobody decides on a submission of their own team. */
export function canDecide(viewer: Viewer, submission: GuardedSubmission): boolean {
  if (!hasRole(viewer, "admin") || !hasScope(viewer, "review")) return false;
  return !isOwnTeam(viewer, submission) && submission.state === "inReview";
}

export function canWithdraw(viewer: Viewer, submission: GuardedSubmission): boolean {
  if (viewer === null || submission.state !== "listed") return false;
  if (hasRole(viewer, "admin") && hasScope(viewer, "review")) return true;
  return isOwnTeam(viewer, submission) && viewer.isEmailVerified && hasScope(viewer, "submit");
}

export function permissionsOf(viewer: Viewer, submission: GuardedSubmission): SubmissionPermissions {
  return {
    canHandIn: canHandIn(viewer, submission),
    canDecide: canDecide(viewer, submission),
    canWithdraw: canWithdraw(viewer, submission),
    isOwnTeam: isOwnTeam(viewer, submission),
  };
}
