import { and, asc, desc, eq, exists, inArray, not, type SQL, sql } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { decisions, findings, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireRole, requireScope } from "../accounts/viewer-policy";
import { selectSummaries, toSummary } from "../submissions/list-submissions.server";
import { isOwnTeam } from "../submissions/submission-policy";
import type { ModerationItem, ModerationList } from "./moderation-view";
import {
  moderationTabs,
  noFinding,
  tabStates,
  type ModerationQuery,
  type ModerationTab,
} from "./moderation-query";

const mostItems = 200;

/** One of the lists of the moderation page: what waits, oldest first; what was decided, latest first. */
export async function listModeration(viewer: Viewer, query: ModerationQuery): Promise<ModerationList> {
  requireRole(viewer, "admin");
  requireScope(viewer, "review");
  const isInTab = eq(submissions.state, tabStates[query.tab]);
  const [rows, counts, codes] = await Promise.all([
    selectSummaries(and(isInTab, matchesFinding(query.finding)), orderOf(query.tab), mostItems),
    countTabs(),
    codesIn(isInTab),
  ]);
  const ids = rows.map((row) => row.id);
  const [found, decided] = await Promise.all([findingsOf(ids), lastDecisionsOf(ids)]);
  const items: ModerationItem[] = rows.map((row) => ({
    ...toSummary(row),
    handedInAt: row.handedInAt ?? row.createdAt,
    findings: found.get(row.id) ?? [],
    decision: decided.get(row.id) ?? null,
    isOwnTeam: isOwnTeam(viewer, row),
  }));
  return { items, counts, codes };
}

function orderOf(tab: ModerationTab): SQL[] {
  if (tab === "waiting") return [asc(submissions.handedInAt), asc(submissions.number)];
  if (tab === "listed") return [desc(submissions.listedAt), desc(submissions.number)];
  return [desc(submissions.handedInAt), desc(submissions.number)];
}

function matchesFinding(code: string | null): SQL | undefined {
  if (code === null) return undefined;
  const ofSubmission = eq(findings.submissionId, submissions.id);
  if (code === noFinding) return not(exists(db.select().from(findings).where(ofSubmission)));
  return exists(
    db
      .select()
      .from(findings)
      .where(and(ofSubmission, eq(findings.code, code))),
  );
}

async function countTabs(): Promise<Record<ModerationTab, number>> {
  const rows = await db
    .select({ state: submissions.state, count: sql<number>`count(*)::int` })
    .from(submissions)
    .where(inArray(submissions.state, Object.values(tabStates)))
    .groupBy(submissions.state);
  const counts = new Map(rows.map((row) => [row.state, row.count]));
  return Object.fromEntries(moderationTabs.map((tab) => [tab, counts.get(tabStates[tab]) ?? 0])) as Record<
    ModerationTab,
    number
  >;
}

async function codesIn(isInTab: SQL): Promise<string[]> {
  const rows = await db
    .selectDistinct({ code: findings.code })
    .from(findings)
    .innerJoin(submissions, eq(submissions.id, findings.submissionId))
    .where(isInTab)
    .orderBy(asc(findings.code));
  return rows.map((row) => row.code);
}

/** The gravest first, without repeating what several runs or scorers found alike. */
async function findingsOf(ids: string[]): Promise<Map<string, ModerationItem["findings"]>> {
  const kept = new Map<string, ModerationItem["findings"]>();
  if (ids.length === 0) return kept;
  const rows = await db
    .select({
      submissionId: findings.submissionId,
      code: findings.code,
      severity: findings.severity,
      message: findings.message,
    })
    .from(findings)
    .where(inArray(findings.submissionId, ids))
    .orderBy(desc(findings.severity), asc(findings.code), asc(findings.message));
  for (const { submissionId, ...finding } of rows) {
    const before = kept.get(submissionId) ?? [];
    if (!before.some((other) => other.code === finding.code)) kept.set(submissionId, [...before, finding]);
  }
  return kept;
}

async function lastDecisionsOf(ids: string[]): Promise<Map<string, NonNullable<ModerationItem["decision"]>>> {
  if (ids.length === 0) return new Map();
  const rows = await db
    .selectDistinctOn([decisions.submissionId], {
      submissionId: decisions.submissionId,
      kind: decisions.kind,
      note: decisions.note,
      createdAt: decisions.createdAt,
    })
    .from(decisions)
    .where(inArray(decisions.submissionId, ids))
    .orderBy(decisions.submissionId, desc(decisions.createdAt));
  return new Map(rows.map(({ submissionId, ...decision }) => [submissionId, decision]));
}
