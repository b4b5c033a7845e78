import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import { createApiKey } from "@/app/features/api-keys/create-api-key.server";
import { viewerOfApiKey } from "@/app/features/api-keys/viewer-of-api-key.server";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { receiveSubmission } from "@/app/features/submissions/receive-submission.server";
import { db } from "@/app/platform/db.server";
import { getBytes } from "@/app/platform/storage.server";
import { files, runs, solvers, solverVersions, submissions } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";
import { advectionStudy, makeAccount, storeFiles, submit } from "../../support/register";

useDatabase();

let author: Account;

beforeAll(async () => {
  await publishShippedProblems();
  author = await makeAccount("author", "Sending Group");
});

const study = (input: Partial<Parameters<typeof advectionStudy>[0]> = {}) =>
  advectionStudy({ team: "sending-group", ...input });

/** What is refused must leave neither rows nor stored bytes. */
async function expectRefused(viewer: Account | null, toSend: ReturnType<typeof study>, expected: object) {
  const before = await db.$count(submissions);
  const stored = await storeFiles(toSend.files);
  await expect(receiveSubmission(viewer, toSend.part, stored)).rejects.toMatchObject(expected);
  expect(await db.$count(submissions)).toBe(before);
  for (const { storageKey } of stored) await expect(getBytes(storageKey)).rejects.toThrow();
}

describe("receiving a submission", () => {
  it("writes the submission, its files with their checksums and its runs in the order given", async () => {
    const toSend = study({ nodes: [32, 16], solver: "written" });
    const stored = await storeFiles(toSend.files);
    const { id, number } = await receiveSubmission(author, toSend.part, stored);
    expect(number).toBeGreaterThan(1000);
    const rows = await db
      .select({ n: runs.n, ordinal: runs.ordinal, sha256: files.sha256, state: runs.state })
      .from(runs)
      .innerJoin(files, eq(files.id, runs.fileId))
      .where(eq(runs.submissionId, id))
      .orderBy(runs.ordinal);
    const checksum = (name: string) => stored.find((file) => file.name === name)?.sha256;
    expect(rows).toEqual([
      { n: [32], ordinal: 0, sha256: checksum("n0032.npz"), state: "waiting" },
      { n: [16], ordinal: 1, sha256: checksum("n0016.npz"), state: "waiting" },
    ]);
  });

  it("registers a new solver and version from the optional fields, and finds them again without", async () => {
    const toSend = study({ solver: "new-one", version: "2.0", order: 4 });
    await submit(author, toSend);
    toSend.part.solver = { team: "sending-group", solver: "new-one", version: "2.0" };
    delete toSend.part.claim;
    const { id } = await submit(author, toSend);
    const [row] = await db
      .select({
        solver: solvers.slug,
        order: solverVersions.formalOrder,
        declaration: submissions.declaration,
      })
      .from(submissions)
      .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
      .innerJoin(solvers, eq(solvers.id, solverVersions.solverId))
      .where(eq(submissions.id, id));
    expect(row).toMatchObject({
      solver: "new-one",
      order: 4,
      declaration: { claim: { kind: "algebraic", order: 4 } },
    });
    expect(await db.$count(solvers, eq(solvers.slug, "new-one"))).toBe(1);
  });

  it("registers a new solver once where two submissions name it at the same moment", async () => {
    const received = await Promise.all(
      [1, 2, 3].map((scale) => submit(author, study({ solver: "rushed", scale }))),
    );
    expect(new Set(received.map(({ id }) => id)).size).toBe(3);
    expect(await db.$count(solvers, eq(solvers.slug, "rushed"))).toBe(1);
  });

  it("refuses a visitor, an unverified account, a team of others and a token without the scope", async () => {
    await expectRefused(null, study(), { kind: "unauthenticated" });
    await expectRefused({ ...author, isEmailVerified: false }, study(), { kind: "forbidden" });
    await expectRefused(author, study({ team: "somebody-elses" }), { kind: "forbidden" });
    await expectRefused({ ...author, scopes: ["read"] }, study(), { kind: "forbidden" });
  });

  it("refuses an unknown solver without family and method by naming both fields", async () => {
    const toSend = study();
    toSend.part.solver = { team: "sending-group", solver: "unknown", version: "1" };
    await expectRefused(author, toSend, {
      kind: "invalid",
      details: { fields: { "solver.family": expect.any(String), "solver.method": expect.any(String) } },
    });
    expect(await db.$count(solvers, eq(solvers.slug, "unknown"))).toBe(0);
  });

  it("refuses a problem and a revision that do not exist", async () => {
    const unknown = study();
    unknown.part.problem = "no-such-problem";
    await expectRefused(author, unknown, { kind: "notFound" });
    const old = study();
    old.part.revision = 99;
    await expectRefused(author, old, { kind: "notFound" });
  });

  it("names every place of a malformed part", async () => {
    const toSend = study();
    Object.assign(toSend.part, { precision: "float16", extra: 1 });
    toSend.part.runs[1].n = [0.5];
    await expectRefused(author, toSend, {
      kind: "invalid",
      details: { fields: { precision: expect.any(String), "runs[1].n[0]": expect.any(String) } },
    });
  });

  it("reports files that are missing and files that no run names together", async () => {
    const toSend = study();
    toSend.part.runs[0].file = "elsewhere.npz";
    await expectRefused(author, toSend, {
      kind: "invalid",
      details: {
        refusals: [
          { code: "files/missing", file: "elsewhere.npz", where: "runs[0]" },
          { code: "files/unused", file: "n0016.npz" },
        ],
      },
    });
  });

  it("refuses a grid that the problem does not allow before anything is scored", async () => {
    const toSend = study();
    toSend.part.grid = { x: { kind: "chebyshev-lobatto" } };
    await expectRefused(author, toSend, { kind: "invalid", details: { refusals: [expect.anything()] } });
  });
});

describe("an Idempotency-Key", () => {
  let token: Account;

  beforeAll(async () => {
    const { secret } = await createApiKey(author, {
      name: "ci",
      scopes: ["read", "submit"],
      expiresInDays: null,
    });
    token = (await viewerOfApiKey(secret)) as Account;
  });

  const send = async (idempotencyKey: string, toSend = study({ solver: "repeated" })) => {
    const stored = await storeFiles(toSend.files);
    return { stored, received: await receiveSubmission(token, toSend.part, stored, { idempotencyKey }) };
  };

  it("answers a repeat with the first submission and keeps nothing of the second upload", async () => {
    const first = await send("a");
    const second = await send("a");
    expect(second.received).toEqual(first.received);
    await expect(getBytes(second.stored[0].storageKey)).rejects.toThrow();
    expect(await getBytes(first.stored[0].storageKey)).toHaveLength(first.stored[0].sizeBytes);
  });

  it("makes one submission of two requests that come at the same moment", async () => {
    const [a, b] = await Promise.all([send("b"), send("b")]);
    expect(a.received.id).toBe(b.received.id);
  });

  it("refuses a different request with a conflict, and is free again after a refusal", async () => {
    await send("c");
    await expect(send("c", study({ solver: "repeated", scale: 3 }))).rejects.toMatchObject({
      kind: "conflict",
    });
    const broken = study({ solver: "repeated" });
    broken.part.runs[0].file = "missing.npz";
    await expect(send("d", broken)).rejects.toMatchObject({ kind: "invalid" });
    expect((await send("d")).received.state).toBe("checking");
  });
});
