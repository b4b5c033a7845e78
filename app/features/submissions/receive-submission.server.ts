import { db, type Transaction } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import { forbidden, invalid, refusedData } from "@/app/platform/errors";
import { enqueue } from "@/app/platform/queue.server";
import { checkDeclaration } from "@/benchmarks/scoring/check-declaration";
import type { SubmissionState } from "@/drizzle/enums";
import { files, runs, submissions } from "@/drizzle/schema";
import type { Account, Viewer } from "../accounts/viewer";
import { requireScope, requireVerified } from "../accounts/viewer-policy";
import { findRevision } from "../problems/find-revision.server";
import { findSolverVersion } from "./find-solver-version.server";
import { bodyHashOf, claimIdempotencyKey, keepIdempotentAnswer } from "./idempotency.server";
import { matchFiles } from "./match-files";
import { parsePart } from "./parse-part";
import { removeUnreferenced } from "./remove-unreferenced.server";
import type { StoredFile } from "./stored-file";
import { submissionPart, toDeclaration, toRunDeclarations, type SubmissionPart } from "./submission-form";
import { variantOf } from "./variant";

export interface ReceivedSubmission {
  id: string;
  state: SubmissionState;
  /** Shown as S-1001. */
  number: number;
}

/** Who may send files at all; asked before the first byte of a body is read. */
export function requireSubmitter(viewer: Viewer): Account {
  const account = requireVerified(viewer);
  requireScope(account, "submit");
  return account;
}

/**
 * Takes a refinement study whose files are in storage already: rows and the scoring job in one transaction.
 * Whatever it refuses, the stored files are gone afterwards.
 */
export async function receiveSubmission(
  viewer: Viewer,
  part: unknown,
  storedFiles: StoredFile[],
  options: { idempotencyKey?: string | null } = {},
): Promise<ReceivedSubmission> {
  const storageKeys = storedFiles.map((file) => file.storageKey);
  try {
    const account = requireSubmitter(viewer);
    const parsed = parsePart(submissionPart, part);
    const key = options.idempotencyKey ?? null;
    const received = await db.transaction(async (tx) => {
      if (key === null || account.apiKeyId === null) {
        return { submission: await writeSubmission(tx, account, parsed, storedFiles), isRepeat: false };
      }
      const earlier = await claimIdempotencyKey(tx, account.apiKeyId, key, bodyHashOf(parsed, storedFiles));
      if (earlier) return { submission: earlier.body as ReceivedSubmission, isRepeat: true };
      const submission = await writeSubmission(tx, account, parsed, storedFiles);
      await keepIdempotentAnswer(tx, account.apiKeyId, key, { status: 201, body: submission });
      return { submission, isRepeat: false };
    });
    if (received.isRepeat) await removeUnreferenced(storageKeys);
    return received.submission;
  } catch (error) {
    await removeUnreferenced(storageKeys);
    throw error;
  }
}

async function writeSubmission(
  tx: Transaction,
  account: Account,
  part: SubmissionPart,
  storedFiles: StoredFile[],
): Promise<ReceivedSubmission> {
  const plan = await planSubmission(tx, account, part, storedFiles);
  const [submission] = await tx
    .insert(submissions)
    .values({
      problemRevisionId: plan.revisionId,
      solverVersionId: plan.solverVersionId,
      teamId: plan.teamId,
      submittedById: account.userId,
      state: "checking",
      declaration: plan.declaration,
      variant: variantOf(plan.declaration),
      dataLicence: part.dataLicence,
    })
    .returning({ id: submissions.id, state: submissions.state, number: submissions.number });
  const stored = await tx
    .insert(files)
    .values(
      plan.matched.map(({ name, sha256, sizeBytes, storageKey }) => ({
        name,
        sha256,
        sizeBytes,
        storageKey,
      })),
    )
    .returning({ id: files.id, storageKey: files.storageKey });
  const fileIds = new Map(stored.map((file) => [file.storageKey, file.id]));
  await tx.insert(runs).values(
    toRunDeclarations(part).map(({ file: _, ...run }, ordinal) => ({
      ...run,
      submissionId: submission.id,
      fileId: fileIds.get(plan.matched[ordinal].storageKey) ?? "",
      ordinal,
    })),
  );
  await enqueue(tx, "score-submission", { submissionId: submission.id });
  await publish(tx, { submissionId: submission.id, kind: "state", state: submission.state });
  return submission;
}

export interface SubmissionPlan {
  teamId: string;
  revisionId: string;
  solverVersionId: string;
  declaration: ReturnType<typeof toDeclaration>;
  /** One file for each run, in the order of the runs. */
  matched: StoredFile[];
}

/** Everything that is checked before a row of the submission is written; the solver's rows may be new. */
export async function planSubmission(
  tx: Transaction,
  account: Account,
  part: SubmissionPart,
  storedFiles: StoredFile[],
): Promise<SubmissionPlan> {
  const team = account.teams.find((candidate) => candidate.slug === part.solver.team);
  if (!team)
    throw forbidden(`You are not a member of a team ${part.solver.team}. Submit for a team of your own.`);
  const revision = await findRevision(part.problem, part.revision ?? null, tx);
  if (!revision.isCurrent) {
    throw invalid(`Revision ${revision.number} of ${part.problem} is retired; submit to the current one.`, {
      revision: "Leave it out for the current revision.",
    });
  }
  const { solverVersionId, claim } = await findSolverVersion(tx, team.id, part.solver, part.claim);
  const declaration = toDeclaration(part, claim);
  const { matched, refusals } = matchFiles(part.runs, storedFiles);
  refusals.unshift(...checkDeclaration(revision.definition, declaration, toRunDeclarations(part)));
  if (refusals.length > 0) throw refusedData(refusals);
  return { teamId: team.id, revisionId: revision.revisionId, solverVersionId, declaration, matched };
}
