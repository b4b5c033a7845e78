import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import { logger } from "@/app/platform/logger.server";
import { getBytes } from "@/app/platform/storage.server";
import { finestNodes } from "@/benchmarks/scoring/between-nodes";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { RunScore } from "@/benchmarks/scoring/result";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";
import { scoreStudy } from "@/benchmarks/scoring/score-study";
import { runs, runScores, submissions } from "@/drizzle/schema";
import { findSameFiles } from "./find-same-files.server";
import { scoreBytes } from "./score-bytes";
import { loadStoredStudy, type StoredRun, type StoredStudy } from "./stored-study.server";
import { writeStudy } from "./write-study.server";

/**
 * Scores a submission in state `checking`: run by run, each kept as soon as it is known, then the study.
 * Safe to repeat at any point: what exists under this scorer version is not computed again, and once the
 * submission has left `checking` nothing happens.
 */
export async function scoreStoredSubmission(submissionId: string): Promise<void> {
  const study = await loadStoredStudy(submissionId);
  if (study?.state !== "checking") return;
  const scored: { run: StoredRun; score: RunScore }[] = [];
  const refusals: Refusal[] = [];
  for (const run of study.runs) {
    const outcome = run.score ? { score: run.score, refusal: null } : await scoreStoredRun(study, run);
    if (outcome.score) scored.push({ run, score: outcome.score });
    else refusals.push(outcome.refusal);
  }
  if (refusals.length > 0) {
    await refuse(study, refusals);
    return;
  }
  const result = scoreStudy(
    study.problem,
    study.declaration,
    scored.map(({ run, score }) => ({ declaration: run.declaration, score })),
  );
  const findings = [...result.findings, ...(await findSameFiles(study))];
  await writeStudy(study, result.studies, findings);
  logger.info("submission scored", { submissionId, runs: scored.length, scorerVersion });
}

async function scoreStoredRun(study: StoredStudy, run: StoredRun) {
  const bytes = await getBytes(run.storageKey);
  if (createHash("sha256").update(bytes).digest("hex") !== run.sha256) {
    throw new Error(`The stored bytes of run ${run.id} do not have the checksum that was taken at upload.`);
  }
  const finest = finestNodes(study.runs.map((one) => one.declaration));
  const outcome = scoreBytes(study.problem, study.declaration, run.declaration, bytes, finest);
  await db.transaction(async (tx) => {
    if (outcome.score) {
      await tx
        .insert(runScores)
        .values({ runId: run.id, problemRevisionId: study.revisionId, scorerVersion, score: outcome.score })
        .onConflictDoNothing();
    }
    await tx
      .update(runs)
      .set({ state: outcome.score ? "scored" : "refused", refusal: outcome.refusal })
      .where(eq(runs.id, run.id));
    await publish(tx, {
      submissionId: study.submissionId,
      kind: "run",
      runId: run.id,
      state: outcome.score ? "scored" : "refused",
    });
  });
  return outcome;
}

async function refuse(study: StoredStudy, refusals: Refusal[]): Promise<void> {
  await db.transaction(async (tx) => {
    const failed = await tx
      .update(submissions)
      .set({ state: "failed", refusals })
      .where(and(eq(submissions.id, study.submissionId), eq(submissions.state, "checking")))
      .returning({ id: submissions.id });
    if (failed.length > 0)
      await publish(tx, { submissionId: study.submissionId, kind: "state", state: "failed" });
  });
  logger.info("submission refused", {
    submissionId: study.submissionId,
    codes: refusals.map(({ code }) => code),
  });
}
