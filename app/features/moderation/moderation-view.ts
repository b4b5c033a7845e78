import type { FindingSeverity } from "@/drizzle/enums";
import type { DecisionView, SubmissionSummary } from "../submissions/submission-view";
import type { ModerationTab } from "./moderation-query";

/** One submission that waits for a decision. */
export interface QueueItem extends SubmissionSummary {
  handedInAt: Date;
  findings: { strong: number; warning: number; note: number };
  /** The viewer belongs to the team, so somebody else must decide. */
  isOwnTeam: boolean;
}

/** One line of a list of the moderation page. */
export interface ModerationItem extends SubmissionSummary {
  handedInAt: Date;
  /** One of each code, the gravest first. */
  findings: { code: string; severity: FindingSeverity; message: string }[];
  /** The last one; null before any. */
  decision: DecisionView | null;
  isOwnTeam: boolean;
}

export interface ModerationList {
  items: ModerationItem[];
  counts: Record<ModerationTab, number>;
  /** Codes of the findings that occur in the list, to filter by. */
  codes: string[];
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
