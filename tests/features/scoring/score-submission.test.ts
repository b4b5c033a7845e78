import { asc, eq } from "drizzle-orm";
import { Readable } from "node:stream";
import { beforeAll, describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { scoreStoredSubmission } from "@/app/features/scoring/score-submission.server";
import { getSubmission } from "@/app/features/submissions/get-submission.server";
import { receiveSubmission } from "@/app/features/submissions/receive-submission.server";
import { db } from "@/app/platform/db.server";
import { getBytes, putStream, remove } from "@/app/platform/storage.server";
import { findings, marks, runs, runScores, studies, submissions } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";
import { advectionStudy, makeAccount, storeFiles, submit } from "../../support/register";

useDatabase();

let author: Account;

beforeAll(async () => {
  await publishShippedProblems();
  author = await makeAccount("author", "Scored Group");
});

const study = (input: Partial<Parameters<typeof advectionStudy>[0]> = {}) =>
  advectionStudy({ team: "scored-group", ...input });

const scoresOf = (submissionId: string) =>
  db
    .select({ id: runScores.id, ordinal: runs.ordinal, score: runScores.score })
    .from(runScores)
    .innerJoin(runs, eq(runs.id, runScores.runId))
    .where(eq(runs.submissionId, submissionId))
    .orderBy(asc(runs.ordinal));

const everythingOf = async (submissionId: string) => ({
  scores: await scoresOf(submissionId),
  studies: await db.select().from(studies).where(eq(studies.submissionId, submissionId)).orderBy(studies.id),
  findings: await db
    .select()
    .from(findings)
    .where(eq(findings.submissionId, submissionId))
    .orderBy(findings.id),
  marks: await db.$count(marks, eq(marks.submissionId, submissionId)),
  submission: await db.select().from(submissions).where(eq(submissions.id, submissionId)),
});

describe("scoring a stored submission", () => {
  it("changes nothing when it is repeated", async () => {
    const { id } = await submit(author, study());
    await scoreStoredSubmission(id);
    const once = await everythingOf(id);
    await scoreStoredSubmission(id);
    expect(await everythingOf(id)).toEqual(once);
    expect(once.submission[0].state).toBe("scored");
    expect(once.marks).toBeGreaterThan(0);
  });

  it("gives one result where two workers score at the same moment", async () => {
    const { id } = await submit(author, study());
    await Promise.all([scoreStoredSubmission(id), scoreStoredSubmission(id)]);
    const { scores, studies: written, submission } = await everythingOf(id);
    expect(scores.map(({ ordinal }) => ordinal)).toEqual([0, 1, 2, 3]);
    expect(new Set(written.map(({ norm, measure }) => `${norm} ${measure}`)).size).toBe(written.length);
    expect(submission[0].state).toBe("scored");
  });

  it("goes on where it broke off, keeping the runs that were scored", async () => {
    const { part, files } = study();
    const stored = await storeFiles(files);
    const { id } = await receiveSubmission(author, part, stored);
    const third = stored[2];
    const bytes = await getBytes(third.storageKey);
    await remove(third.storageKey);
    await expect(scoreStoredSubmission(id)).rejects.toThrow();
    const before = await scoresOf(id);
    expect(before.map(({ ordinal }) => ordinal)).toEqual([0, 1]);
    expect((await getSubmission(author, id)).state).toBe("checking");

    await putStream(third.storageKey, Readable.from([Buffer.from(bytes)]), {});
    await scoreStoredSubmission(id);
    expect((await scoresOf(id)).slice(0, 2)).toEqual(before);
    expect((await getSubmission(author, id)).state).toBe("scored");
  });

  it("does not score bytes that differ from the checksum taken at upload", async () => {
    const { part, files } = study();
    const stored = await storeFiles(files);
    const { id } = await receiveSubmission(author, part, stored);
    await putStream(stored[1].storageKey, Readable.from([Buffer.from(files["n0016.npz"])]), {});
    await expect(scoreStoredSubmission(id)).rejects.toThrow("checksum");
    expect((await getSubmission(author, id)).state).toBe("checking");
  });

  it("fails with every refusal at once where files are bad, each with its file and place", async () => {
    const toSend = study();
    toSend.files["n0016.npz"] = toSend.files["n0016.npz"].slice(0, 100);
    toSend.files["n0064.npz"] = toSend.files["n0032.npz"];
    const { id } = await submit(author, toSend);
    await scoreStoredSubmission(id);
    const { state, refusals, runs: shown, study: none } = await getSubmission(author, id);
    expect(state).toBe("failed");
    expect(none).toBeNull();
    expect(refusals.map((refusal) => refusal.file)).toEqual(["n0016.npz", "n0064.npz"]);
    for (const refusal of refusals) expect(refusal.code).toMatch(/^[a-z]+\/[a-z-]+$/);
    expect(shown.map((run) => run.state)).toEqual(["refused", "scored", "refused", "scored"]);
  });

  it("does nothing for a submission that does not exist", async () => {
    await expect(scoreStoredSubmission("00000000-0000-4000-8000-000000000000")).resolves.toBeUndefined();
  });
});
