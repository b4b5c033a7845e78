import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { rankProblem } from "@/app/features/rankings/rank-problem.server";
import { parseRankingQuery } from "@/app/features/rankings/ranking-query";
import { scoreStoredSubmission } from "@/app/features/scoring/score-submission.server";
import { getRecord, getSubmission } from "@/app/features/submissions/get-submission.server";
import { handInSubmission } from "@/app/features/submissions/hand-in-submission.server";
import { listMySubmissions, listRecords } from "@/app/features/submissions/list-submissions.server";
import { withdrawSubmission } from "@/app/features/submissions/withdraw-submission.server";
import { listQueue } from "@/app/features/moderation/list-queue.server";
import { listSubmission } from "@/app/features/moderation/list-submission.server";
import { returnSubmission } from "@/app/features/moderation/return-submission.server";
import { db } from "@/app/platform/db.server";
import { auditEvents, marks } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";
import { advectionStudy, makeAccount, submit, submitAndList, submitForReview } from "../../support/register";

useDatabase();

let author: Account;
let admin: Account;
let stranger: Account;

beforeAll(async () => {
  await publishShippedProblems();
  author = await makeAccount("author", "Path Group");
  stranger = await makeAccount("author", "Another Group");
  admin = await makeAccount("admin");
});

const study = (input: Partial<Parameters<typeof advectionStudy>[0]> = {}) =>
  advectionStudy({ team: "path-group", ...input });

const ranking = (search = "") =>
  rankProblem(null, "advection-exp-sine", parseRankingQuery(new URLSearchParams(search)));

const auditOf = async (subjectId: string) =>
  (
    await db.select().from(auditEvents).where(eq(auditEvents.subjectId, subjectId)).orderBy(auditEvents.id)
  ).map((event) => event.action);

describe("the path of a submission", () => {
  it("leads from files to a rank: received, scored, handed in, listed, ranked", async () => {
    const { id, state } = await submit(author, study({ solver: "whole-path" }));
    expect(state).toBe("checking");
    await scoreStoredSubmission(id);
    const scored = await getSubmission(author, id);
    expect(scored.state).toBe("scored");
    expect(scored.runs.map((run) => [run.n, run.state])).toEqual(
      [16, 32, 64, 128].map((n) => [[n], "scored"]),
    );
    expect(scored.study).toMatchObject({ kind: "algebraic", verdict: "confirmed" });
    // The error was made as n^-2 cos(2x), so the observed order is 2 and the maximum norm n^-2.
    expect(scored.study?.order).toBeCloseTo(2, 6);
    expect(scored.runs[1].score?.times.at(-1)?.nodes.max).toBeCloseTo(32 ** -2, 12);

    expect((await handInSubmission(author, id)).state).toBe("inReview");
    expect((await listQueue(admin)).map((item) => item.id)).toContain(id);
    const { record } = await listSubmission(admin, { id, note: "The evidence holds." });
    expect(record.version).toBe(1);
    const { rows } = await ranking("tolerance=1e-3");
    const row = rows.find((candidate) => candidate.submissionId === id);
    expect(row).toMatchObject({ record, formalOrder: 2, team: { slug: "path-group" }, atMost: false });
    expect(row?.errorAtReading).toBeLessThanOrEqual(1e-3);
    expect(await auditOf(id)).toEqual(["submission.handedIn", "submission.listed"]);
    expect((await getRecord(null, record.number, 1)).id).toBe(id);
    expect((await listRecords()).items[0]).toMatchObject({ id, record, runs: 4 });
  });

  it("leads back to the team with a note, and in again", async () => {
    const id = await submitForReview(author, study({ solver: "returned" }));
    await returnSubmission(admin, { id, note: "Say which limiter was used." });
    const returned = await getSubmission(author, id);
    expect(returned.decisions).toMatchObject([{ kind: "return", note: "Say which limiter was used." }]);
    expect(returned.permissions.canHandIn).toBe(true);
    expect((await handInSubmission(author, id)).state).toBe("inReview");
    expect(await auditOf(id)).toEqual(["submission.handedIn", "submission.returned", "submission.handedIn"]);
  });

  it("ends withdrawn with the record readable, its note shown to all and the ranking without it", async () => {
    const { id, record } = await submitAndList(author, admin, study({ solver: "withdrawn" }));
    await withdrawSubmission(author, { id, note: "A wrong sign in the source term." });
    const shown = await getRecord(null, record.number, record.version);
    expect(shown).toMatchObject({ state: "withdrawn", decisions: [{ kind: "withdraw" }] });
    expect(shown.runs[0].file.sha256).toMatch(/^[0-9a-f]{64}$/);
    expect((await ranking("tolerance=1")).rows.map((row) => row.submissionId)).not.toContain(id);
    await expect(withdrawSubmission(author, { id, note: "Again." })).rejects.toMatchObject({
      kind: "conflict",
    });
  });
});

describe("a newer listing of the same solver, problem and variant", () => {
  it("supersedes the older one under the same number, and the rankings follow", async () => {
    const first = await submitAndList(author, admin, study({ solver: "twice", version: "1.0" }));
    const second = await submitAndList(author, admin, study({ solver: "twice", version: "1.1", scale: 0.5 }));
    expect(second.record).toEqual({ number: first.record.number, version: 2 });
    const old = await getRecord(null, first.record.number, 1);
    expect(old).toMatchObject({ id: first.id, state: "superseded", supersededBy: second.record });
    expect(old.versions.map(({ version, state }) => [version, state])).toEqual([
      [2, "listed"],
      [1, "superseded"],
    ]);
    const ranked = (await ranking("tolerance=1e-2")).rows.map((row) => row.submissionId);
    expect([ranked.includes(first.id), ranked.includes(second.id)]).toEqual([false, true]);
    const listedMarks = (submissionId: string) =>
      db.$count(marks, and(eq(marks.submissionId, submissionId), marks.isListed));
    expect(await listedMarks(first.id)).toBe(0);
    expect(await listedMarks(second.id)).toBeGreaterThan(0);
  });

  it("leaves one of another precision beside it, with a number of its own", async () => {
    const first = await submitAndList(author, admin, study({ solver: "variants" }));
    const single = study({ solver: "variants" });
    single.part.precision = "float32";
    const second = await submitAndList(author, admin, single);
    expect(second.record).toEqual({ number: second.record.number, version: 1 });
    expect(second.record.number).not.toBe(first.record.number);
    expect((await getRecord(null, first.record.number, 1)).state).toBe("listed");
  });

  it("gets one number only where two admins list two of them at the same moment", async () => {
    const ids = [
      await submitForReview(author, study({ solver: "race", version: "1.0" })),
      await submitForReview(author, study({ solver: "race", version: "1.1" })),
    ];
    const other = await makeAccount("admin");
    const listed = await Promise.all([
      listSubmission(admin, { id: ids[0], note: "Listed." }),
      listSubmission(other, { id: ids[1], note: "Listed." }),
    ]);
    expect(new Set(listed.map(({ record }) => record.number)).size).toBe(1);
    expect(listed.map(({ record }) => record.version).sort()).toEqual([1, 2]);
    const states = await Promise.all(ids.map(async (id) => (await getSubmission(null, id)).state));
    expect(states.sort()).toEqual(["listed", "superseded"]);
  });
});

describe("a decision", () => {
  it("is taken once: of two admins who decide at the same moment one gets a conflict", async () => {
    const id = await submitForReview(author, study({ solver: "decided-twice" }));
    const other = await makeAccount("admin");
    const outcomes = await Promise.allSettled([
      listSubmission(admin, { id, note: "Listed." }),
      returnSubmission(other, { id, note: "Returned." }),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const refused = outcomes.find((outcome) => outcome.status === "rejected");
    expect(refused?.reason).toMatchObject({ kind: "conflict" });
    const decided = await getSubmission(admin, id);
    expect(decided.decisions).toHaveLength(1);
    expect((await auditOf(id)).length).toBe(2);
  });

  it("needs a note, an admin, and not one of the submission's own team", async () => {
    const id = await submitForReview(author, study({ solver: "guarded" }));
    await expect(listSubmission(admin, { id, note: "  " })).rejects.toMatchObject({ kind: "invalid" });
    await expect(listSubmission(author, { id, note: "Mine." })).rejects.toMatchObject({ kind: "forbidden" });
    await expect(listSubmission(null, { id, note: "x" })).rejects.toMatchObject({ kind: "unauthenticated" });
    const ownAdmin: Account = { ...admin, teams: author.teams };
    await expect(listSubmission(ownAdmin, { id, note: "x" })).rejects.toMatchObject({ kind: "forbidden" });
    await expect(returnSubmission(ownAdmin, { id, note: "x" })).rejects.toMatchObject({ kind: "forbidden" });
    expect((await getSubmission(author, id)).state).toBe("inReview");
  });
});

describe("a submission that is not listed", () => {
  it("does not exist for others, in any list or by its id", async () => {
    const id = await submitForReview(author, study({ solver: "private" }));
    for (const viewer of [null, stranger]) {
      await expect(getSubmission(viewer, id)).rejects.toMatchObject({ kind: "notFound" });
    }
    await expect(handInSubmission(stranger, id)).rejects.toMatchObject({ kind: "notFound" });
    await expect(withdrawSubmission(stranger, { id, note: "x" })).rejects.toMatchObject({ kind: "notFound" });
    expect((await listRecords()).items.map((item) => item.id)).not.toContain(id);
    const { rows, notReached, curves } = await ranking("tolerance=1");
    expect([...rows, ...notReached, ...curves].map((row) => row.submissionId)).not.toContain(id);
    expect((await listMySubmissions(stranger)).map((item) => item.id)).not.toContain(id);
    expect((await listMySubmissions(author)).map((item) => item.id)).toContain(id);
    expect((await getSubmission(admin, id)).id).toBe(id);
  });

  it("answers the same to an id that was never given and to one that is no id", async () => {
    for (const id of ["00000000-0000-4000-8000-000000000000", "1", "'; --"]) {
      await expect(getSubmission(admin, id)).rejects.toMatchObject({ kind: "notFound" });
    }
  });

  it("is not told to authors whose file is the same, and is to admins", async () => {
    await submit(author, study({ solver: "first-owner", scale: 0.77 }));
    const copy = advectionStudy({ team: "another-group", solver: "copy", scale: 0.77 });
    const { id } = await submit(stranger, copy);
    await scoreStoredSubmission(id);
    const codesFor = async (viewer: Account) =>
      (await getSubmission(viewer, id)).findings.map(({ code }) => code);
    expect(await codesFor(stranger)).not.toContain("same-file-elsewhere");
    expect(await codesFor(admin)).toContain("same-file-elsewhere");
  });
});
