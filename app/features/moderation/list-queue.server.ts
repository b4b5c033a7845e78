import { asc, eq, inArray, sql } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { findings, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireRole, requireScope } from "../accounts/viewer-policy";
import { selectSummaries, toSummary } from "../submissions/list-submissions.server";
import { isOwnTeam } from "../submissions/submission-policy";
import type { QueueItem } from "./moderation-view";

const mostWaiting = 500;

/** What waits for a decision, oldest first. */
export async function listQueue(viewer: Viewer): Promise<QueueItem[]> {
  requireRole(viewer, "admin");
  requireScope(viewer, "review");
  const rows = await selectSummaries(
    eq(submissions.state, "inReview"),
    [asc(submissions.handedInAt), asc(submissions.number)],
    mostWaiting,
  );
  const counts = await countFindings(rows.map((row) => row.id));
  return rows.map((row) => ({
    ...toSummary(row),
    handedInAt: row.handedInAt ?? row.createdAt,
    findings: counts.get(row.id) ?? { strong: 0, warning: 0, note: 0 },
    isOwnTeam: isOwnTeam(viewer, row),
  }));
}

async function countFindings(submissionIds: string[]) {
  if (submissionIds.length === 0) return new Map<string, QueueItem["findings"]>();
  const count = (severity: keyof QueueItem["findings"]) =>
    sql<number>`count(*) filter (where ${findings.severity} = ${severity})::int`;
  const rows = await db
    .select({
      submissionId: findings.submissionId,
      strong: count("strong"),
      warning: count("warning"),
      note: count("note"),
    })
    .from(findings)
    .where(inArray(findings.submissionId, submissionIds))
    .groupBy(findings.submissionId);
  return new Map(rows.map(({ submissionId, ...counts }) => [submissionId, counts]));
}
