import { and, desc, eq, inArray, isNotNull, lt, or, sql, type SQL } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import {
  problemRevisions,
  problems,
  solvers,
  solverVersions,
  studies,
  submissions,
  teams,
} from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireAccount } from "../accounts/viewer-policy";
import type { RecordSummary, SubmissionSummary } from "./submission-view";

const mostMine = 500;

/** The submissions of the viewer's teams, newest first. */
export async function listMySubmissions(viewer: Viewer): Promise<SubmissionSummary[]> {
  const account = requireAccount(viewer);
  const teamIds = account.teams.map((team) => team.id);
  if (teamIds.length === 0) return [];
  const rows = await selectSummaries(
    inArray(submissions.teamId, teamIds),
    [desc(submissions.createdAt)],
    mostMine,
  );
  return rows.map(toSummary);
}

export interface RecordFilter {
  cursor?: string | null;
  limit?: number;
  problem?: string | null;
}

/** Listed records, latest first. */
export async function listRecords(
  filter: RecordFilter = {},
): Promise<{ items: RecordSummary[]; nextCursor: string | null }> {
  const limit = Math.min(Math.max(filter.limit ?? 50, 1), 200);
  const rows = await selectSummaries(
    and(
      eq(submissions.state, "listed"),
      isNotNull(submissions.listedAt),
      filter.problem ? eq(problems.slug, filter.problem) : undefined,
      filter.cursor ? before(filter.cursor) : undefined,
    ),
    [desc(submissions.listedAt), desc(submissions.number)],
    limit + 1,
  );
  const items = rows.slice(0, limit).map(toSummary).flatMap(asRecord);
  const last = items.at(-1);
  const hasMore = rows.length > limit && last !== undefined;
  return { items, nextCursor: hasMore ? `${last.listedAt.toISOString()}_${last.number}` : null };
}

/** Times are kept to the microsecond, JavaScript's to the millisecond: both sides are cut to that. */
const listedMillisecond = sql`date_trunc('milliseconds', ${submissions.listedAt})`;

function before(cursor: string): SQL | undefined {
  const [time, number] = cursor.split("_");
  const at = new Date(time);
  if (Number.isNaN(at.getTime()) || !/^\d{1,9}$/.test(number ?? "")) {
    throw invalid("The cursor is not one of this list.", { cursor: "Use nextCursor of the page before." });
  }
  const moment = at.toISOString();
  return or(
    sql`${listedMillisecond} < ${moment}::timestamptz`,
    and(sql`${listedMillisecond} = ${moment}::timestamptz`, lt(submissions.number, Number(number))),
  );
}

/** One query for a list of submissions, with the headline study of each. */
export async function selectSummaries(condition: SQL | undefined, order: SQL[], limit: number) {
  return await db
    .select({
      id: submissions.id,
      number: submissions.number,
      state: submissions.state,
      teamId: submissions.teamId,
      problem: {
        slug: problems.slug,
        code: problems.code,
        title: sql<string>`${problemRevisions.definition}->>'title'`,
      },
      solver: { slug: solvers.slug, name: solvers.name },
      version: solverVersions.version,
      family: solvers.family,
      method: solvers.method,
      team: { slug: teams.slug, name: teams.name, isHouse: teams.isHouse },
      recordNumber: submissions.recordNumber,
      recordVersion: submissions.recordVersion,
      runs: sql<number>`(select count(*)::int from runs where runs.submission_id = ${submissions.id})`,
      observed: headline,
      createdAt: submissions.createdAt,
      handedInAt: submissions.handedInAt,
      listedAt: submissions.listedAt,
    })
    .from(submissions)
    .innerJoin(problemRevisions, eq(problemRevisions.id, submissions.problemRevisionId))
    .innerJoin(problems, eq(problems.id, problemRevisions.problemId))
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(solvers, eq(solvers.id, solverVersions.solverId))
    .innerJoin(teams, eq(teams.id, submissions.teamId))
    .where(condition)
    .orderBy(...order)
    .limit(limit);
}

/** Kind, order, rate and verdict of the latest headline study, without its points. */
const headline = sql<SubmissionSummary["observed"]>`(
  select jsonb_build_object(
    'kind', ${studies.study}->'kind', 'order', ${studies.study}->'order',
    'rate', ${studies.study}->'rate', 'verdict', ${studies.study}->'verdict')
  from ${studies}
  where ${studies.submissionId} = ${submissions.id}
    and ${studies.problemRevisionId} = ${submissions.problemRevisionId}
    and ${studies.norm} = 'relL2' and ${studies.measure} = 'nodes'
  order by ${studies.createdAt} desc limit 1)`;

export type SummaryRow = Awaited<ReturnType<typeof selectSummaries>>[number];

export function toSummary({ recordNumber, recordVersion, teamId: _, ...row }: SummaryRow): SubmissionSummary {
  const record =
    recordNumber === null || recordVersion === null ? null : { number: recordNumber, version: recordVersion };
  return { ...row, record };
}

function asRecord(summary: SubmissionSummary): RecordSummary[] {
  const { record, listedAt } = summary;
  return record && listedAt ? [{ ...summary, record, listedAt }] : [];
}
