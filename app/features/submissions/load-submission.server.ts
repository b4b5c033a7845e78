import { and, asc, eq, inArray, type SQL } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import {
  decisions,
  files,
  findings,
  problemRevisions,
  problems,
  runs,
  runScores,
  solvers,
  solverVersions,
  studies,
  submissions,
  teams,
} from "@/drizzle/schema";

/** A submission with the names of what it belongs to; null where the condition meets none. */
export async function loadSubmission(condition: SQL | undefined) {
  const [row] = await db
    .select({
      submission: submissions,
      problem: { slug: problems.slug, code: problems.code },
      revision: {
        number: problemRevisions.number,
        state: problemRevisions.state,
        definition: problemRevisions.definition,
      },
      solver: { slug: solvers.slug, name: solvers.name, family: solvers.family, method: solvers.method },
      version: { version: solverVersions.version, description: solverVersions.description },
      team: { slug: teams.slug, name: teams.name, isHouse: teams.isHouse },
    })
    .from(submissions)
    .innerJoin(problemRevisions, eq(problemRevisions.id, submissions.problemRevisionId))
    .innerJoin(problems, eq(problems.id, problemRevisions.problemId))
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(solvers, eq(solvers.id, solverVersions.solverId))
    .innerJoin(teams, eq(teams.id, submissions.teamId))
    .where(condition);
  return row ?? null;
}

export type LoadedSubmission = NonNullable<Awaited<ReturnType<typeof loadSubmission>>>;

/** Studies under the revision handed in for, latest scorer first. */
export async function loadStudies(submissionId: string, revisionId: string) {
  const rows = await db
    .select({ study: studies.study, scorerVersion: studies.scorerVersion, createdAt: studies.createdAt })
    .from(studies)
    .where(and(eq(studies.submissionId, submissionId), eq(studies.problemRevisionId, revisionId)));
  const latest = rows.reduce<(typeof rows)[number] | null>(
    (best, row) => (best === null || row.createdAt > best.createdAt ? row : best),
    null,
  );
  return {
    scorerVersion: latest?.scorerVersion ?? null,
    studies: rows.filter((row) => row.scorerVersion === latest?.scorerVersion).map((row) => row.study),
  };
}

export async function loadRuns(submissionId: string, revisionId: string, scorerVersion: string) {
  return await db
    .select({ run: runs, file: files, score: runScores.score })
    .from(runs)
    .innerJoin(files, eq(files.id, runs.fileId))
    .leftJoin(
      runScores,
      and(
        eq(runScores.runId, runs.id),
        eq(runScores.problemRevisionId, revisionId),
        eq(runScores.scorerVersion, scorerVersion),
      ),
    )
    .where(eq(runs.submissionId, submissionId))
    .orderBy(asc(runs.ordinal));
}

export async function loadFindings(submissionId: string, scorerVersion: string) {
  return await db
    .select({
      code: findings.code,
      severity: findings.severity,
      message: findings.message,
      run: findings.run,
      figures: findings.figures,
    })
    .from(findings)
    .where(and(eq(findings.submissionId, submissionId), eq(findings.scorerVersion, scorerVersion)));
}

export async function loadDecisions(submissionId: string) {
  return await db
    .select({ kind: decisions.kind, note: decisions.note, createdAt: decisions.createdAt })
    .from(decisions)
    .where(eq(decisions.submissionId, submissionId))
    .orderBy(asc(decisions.createdAt));
}

/** Teams and states of submissions that findings mention. */
export async function loadGuards(submissionIds: string[]) {
  if (submissionIds.length === 0) return [];
  return await db
    .select({ id: submissions.id, state: submissions.state, teamId: submissions.teamId })
    .from(submissions)
    .where(inArray(submissions.id, submissionIds));
}
