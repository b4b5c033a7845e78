import type { SubmissionSummary } from "../submissions/submission-view";

/** One submission that waits for a decision. */
export interface QueueItem extends SubmissionSummary {
  handedInAt: Date;
  findings: { strong: number; warning: number; note: number };
  /** The viewer belongs to the team, so somebody else must decide. */
  isOwnTeam: boolean;
}

export interface AuditLogItem {
  id: number;
  at: Date;
  actorId: string | null;
  action: string;
  subjectKind: string;
  subjectId: string;
  detail: Record<string, unknown>;
  previousHash: string;
  hash: string;
}
