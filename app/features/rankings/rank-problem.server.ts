import { and, desc, eq, inArray, sql } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { curvePoints } from "@/benchmarks/convergence/nodes-for-tolerance";
import { findings, solvers, solverVersions, studies, submissions, teams } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { findRevision } from "../problems/find-revision.server";
import { decidingCodes, whyBetweenOnly, type DecidingFinding } from "./between-only";
import { rankStudies, compareSortKeys, sortKeyOf, type NotReached, type Reached } from "./rank-studies";
import type { NotReachedRow, RankedSubmission, Ranking, RankingCurve, RankingRow } from "./ranking";
import { decodeCursor, encodeCursor } from "./ranking-cursor.server";
import { matchesFilter } from "./ranking-filter";
import type { RankingQuery } from "./ranking-query";

const mostNotReached = 200;
const mostCurves = 200;
/** Fewer places a curve where there are many, so that a crowded chart does not make a heavy page. */
const mostSamples = 4800;

/** The listed submissions of a problem's current revision, ranked at a tolerance from their stored studies. */
export async function rankProblem(
  _viewer: Viewer,
  slug: string,
  query: RankingQuery,
  { withCurves = true }: { withCurves?: boolean } = {},
): Promise<Ranking> {
  const revision = await findRevision(slug, null);
  const candidates = await loadCandidates(revision.revisionId, query);
  // Ranks are among all; the filter only chooses what is shown.
  const all = rankStudies(candidates, query.tolerance, query.by);
  const reached = all.reached.filter((row) => matchesFilter(row.candidate, query));
  const notReached = all.notReached.filter((row) => matchesFilter(row.candidate, query));
  const start = query.cursor === null ? 0 : positionAfter(reached, query.cursor);
  const page = reached.slice(start, start + query.limit);
  const hasMore = start + page.length < reached.length;
  return {
    problem: { slug: revision.slug, code: revision.code, title: revision.definition.title },
    revision: revision.number,
    tolerance: query.tolerance,
    norm: query.norm,
    measure: query.measure,
    by: query.by,
    rows: page.map((row, index) => toRow(row, start + index + 1)),
    notReached: notReached.slice(0, mostNotReached).map(toNotReachedRow),
    total: reached.length,
    nextCursor: hasMore ? encodeCursor(sortKeyOf(page[page.length - 1])) : null,
    curves: withCurves ? toCurves([...reached, ...notReached]) : [],
  };
}

type Listed = Awaited<ReturnType<typeof loadCandidates>>[number];

async function loadCandidates(revisionId: string, { norm, measure }: RankingQuery) {
  const rows = await db
    .selectDistinctOn([studies.submissionId], {
      submissionId: submissions.id,
      recordNumber: submissions.recordNumber,
      recordVersion: submissions.recordVersion,
      solver: { slug: solvers.slug, name: solvers.name },
      version: solverVersions.version,
      team: { slug: teams.slug, name: teams.name, isHouse: teams.isHouse },
      family: solvers.family,
      method: solvers.method,
      declaration: submissions.declaration,
      handedInAt: submissions.handedInAt,
      createdAt: submissions.createdAt,
      study: studies.study,
      deciding: decidingFindings,
    })
    .from(submissions)
    .innerJoin(
      studies,
      and(
        eq(studies.submissionId, submissions.id),
        eq(studies.problemRevisionId, submissions.problemRevisionId),
        eq(studies.norm, norm),
        eq(studies.measure, measure),
      ),
    )
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(solvers, eq(solvers.id, solverVersions.solverId))
    .innerJoin(teams, eq(teams.id, submissions.teamId))
    .where(and(eq(submissions.problemRevisionId, revisionId), eq(submissions.state, "listed")))
    // Of several scorer versions the latest study counts.
    .orderBy(studies.submissionId, desc(studies.createdAt));
  return rows.map(({ deciding, ...row }) => ({
    ...row,
    handedInAt: row.handedInAt ?? row.createdAt,
    barredBy: measure === "nodes" ? whyBetweenOnly(deciding, row.study) : null,
  }));
}

/** Of the scorer version that the study is of. */
const decidingFindings = sql<DecidingFinding[]>`coalesce((
  select jsonb_agg(jsonb_build_object(
    'code', ${findings.code}, 'severity', ${findings.severity}, 'figures', ${findings.figures}))
  from ${findings}
  where ${findings.submissionId} = ${studies.submissionId}
    and ${findings.scorerVersion} = ${studies.scorerVersion}
    and ${inArray(findings.code, decidingCodes)}), '[]'::jsonb)`;

function positionAfter(rows: Reached<Listed>[], cursor: string): number {
  const key = decodeCursor(cursor);
  const next = rows.findIndex((row) => compareSortKeys(sortKeyOf(row), key) > 0);
  return next === -1 ? rows.length : next;
}

function toRanked({ study, declaration, recordNumber, recordVersion, ...row }: Listed): RankedSubmission {
  return {
    submissionId: row.submissionId,
    // The database holds that a listed submission has both.
    record: { number: recordNumber ?? 0, version: recordVersion ?? 0 },
    solver: row.solver,
    version: row.version,
    team: row.team,
    family: row.family,
    method: row.method,
    claim: declaration.claim,
    formalOrder: declaration.claim.kind === "algebraic" ? declaration.claim.order : null,
    precision: declaration.precision,
    observed: { kind: study.kind, order: study.order, rate: study.rate, verdict: study.verdict },
    tail: study.tail,
  };
}

function toRow({ candidate, rank, isTied, reading }: Reached<Listed>, position: number): RankingRow {
  const { nodes, n, atMost, errorAtReading, unknowns, cost } = reading;
  return { ...toRanked(candidate), rank, isTied, position, nodes, n, atMost, errorAtReading, unknowns, cost };
}

function toNotReachedRow({ candidate, smallestError, reason, at }: NotReached<Listed>): NotReachedRow {
  return { ...toRanked(candidate), smallestError, reason, at };
}

function toCurves(rows: { candidate: Listed }[]): RankingCurve[] {
  const drawn = rows.slice(0, mostCurves);
  const samples = Math.max(24, Math.min(96, Math.floor(mostSamples / drawn.length)));
  return drawn.map(({ candidate }) => toCurve(candidate, samples));
}

function toCurve({ submissionId, solver, version, family, study }: Listed, samples: number): RankingCurve {
  return {
    submissionId,
    label: `${solver.name} ${version}`,
    family,
    points: study.points.map(({ n, nodes, intervals, error }) => ({ n, nodes, intervals, error })),
    line: curvePoints(study, samples),
  };
}
