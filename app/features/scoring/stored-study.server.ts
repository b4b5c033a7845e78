import { and, asc, eq } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import type { RunScore } from "@/benchmarks/scoring/result";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";
import type { MethodFamily, SubmissionState } from "@/drizzle/enums";
import {
  files,
  problemRevisions,
  runs,
  runScores,
  solvers,
  solverVersions,
  submissions,
} from "@/drizzle/schema";

export interface StoredRun {
  id: string;
  declaration: RunDeclaration;
  sha256: string;
  storageKey: string;
  /** Under the current scorer version; null while it is still to be computed. */
  score: RunScore | null;
}

export interface StoredStudy {
  submissionId: string;
  state: SubmissionState;
  revisionId: string;
  problem: ProblemDefinition;
  declaration: Declaration;
  family: MethodFamily;
  runs: StoredRun[];
}

/** A submission with its runs in the order they were given and the scores that exist already; null where it is gone. */
export async function loadStoredStudy(submissionId: string): Promise<StoredStudy | null> {
  const [submission] = await db
    .select({
      state: submissions.state,
      revisionId: submissions.problemRevisionId,
      problem: problemRevisions.definition,
      declaration: submissions.declaration,
      family: solvers.family,
    })
    .from(submissions)
    .innerJoin(problemRevisions, eq(problemRevisions.id, submissions.problemRevisionId))
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(solvers, eq(solvers.id, solverVersions.solverId))
    .where(eq(submissions.id, submissionId));
  if (!submission) return null;
  const rows = await db
    .select({ run: runs, file: files, score: runScores.score })
    .from(runs)
    .innerJoin(files, eq(files.id, runs.fileId))
    .leftJoin(
      runScores,
      and(
        eq(runScores.runId, runs.id),
        eq(runScores.problemRevisionId, submission.revisionId),
        eq(runScores.scorerVersion, scorerVersion),
      ),
    )
    .where(eq(runs.submissionId, submissionId))
    .orderBy(asc(runs.ordinal));
  return {
    submissionId,
    ...submission,
    runs: rows.map(({ run, file, score }) => ({
      id: run.id,
      declaration: {
        file: file.name,
        n: run.n,
        role: run.role,
        unknowns: run.unknowns,
        dt: run.dt,
        steps: run.steps,
        wallSeconds: run.wallSeconds,
        yardstickSeconds: run.yardstickSeconds,
      },
      sha256: file.sha256,
      storageKey: file.storageKey,
      score,
    })),
  };
}
