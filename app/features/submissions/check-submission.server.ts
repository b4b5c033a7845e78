import { createHash } from "node:crypto";
import { db } from "@/app/platform/db.server";
import type { Account, Viewer } from "../accounts/viewer";
import { findRevision } from "../problems/find-revision.server";
import { scorePart, type FileBytes, type ScoreAnswer } from "../scoring/score-files.server";
import { parsePart } from "./parse-part";
import { planSubmission, requireSubmitter } from "./receive-submission.server";
import { submissionPart, type SubmissionPart } from "./submission-form";

/** Carries a dry run's result out of the transaction that is rolled back. */
class RolledBack<R> extends Error {
  constructor(readonly result: R) {
    super("The dry run is rolled back.");
  }
}

/** A dry run: everything that handing over these files would check, and their scores; nothing is stored. */
export async function checkSubmission(
  viewer: Viewer,
  part: unknown,
  files: FileBytes[],
): Promise<ScoreAnswer> {
  const account = requireSubmitter(viewer);
  const parsed = parsePart(submissionPart, part);
  const { declaration } = await planAndRollBack(account, parsed, files);
  const revision = await findRevision(parsed.problem, parsed.revision ?? null);
  return await scorePart(revision, parsed, declaration.claim, files);
}

async function planAndRollBack(account: Account, part: SubmissionPart, files: FileBytes[]) {
  const described = files.map(({ name, bytes }) => ({
    name,
    sha256: createHash("sha256").update(bytes).digest("hex"),
    sizeBytes: bytes.byteLength,
    storageKey: "",
  }));
  try {
    return await db.transaction<Awaited<ReturnType<typeof planSubmission>>>(async (tx) => {
      throw new RolledBack(await planSubmission(tx, account, part, described));
    });
  } catch (error) {
    if (error instanceof RolledBack) return error.result as Awaited<ReturnType<typeof planSubmission>>;
    throw error;
  }
}
