import { beforeAll, describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { scoreStoredSubmission } from "@/app/features/scoring/score-submission.server";
import { getSubmission } from "@/app/features/submissions/get-submission.server";
import { db } from "@/app/platform/db.server";
import * as file from "@/app/routes/api/file";
import * as handIn from "@/app/routes/api/hand-in";
import * as listRoute from "@/app/routes/api/list-submission";
import * as progress from "@/app/routes/api/progress";
import * as ranking from "@/app/routes/api/ranking";
import * as record from "@/app/routes/api/record";
import * as returnRoute from "@/app/routes/api/return-submission";
import * as submission from "@/app/routes/api/submission";
import * as submissionsRoute from "@/app/routes/api/submissions";
import * as withdraw from "@/app/routes/api/withdraw";
import { files, solvers, submissions } from "@/drizzle/schema";
import { callRoute, get, postJson } from "../support/call-route";
import { useDatabase } from "../support/database";
import { multipartRequest, submissionParts, type MultipartRequestOptions } from "../support/multipart";
import { advectionStudy, makeAccount, submitAndList, submitForReview } from "../support/register";
import { storedKeys } from "../support/storage";

useDatabase();

let author: Account;
let stranger: Account;
let admin: Account;

beforeAll(async () => {
  await publishShippedProblems();
  author = await makeAccount("author", "Calling Group");
  stranger = await makeAccount("author", "Foreign Group");
  admin = await makeAccount("admin");
});

const study = (input: Partial<Parameters<typeof advectionStudy>[0]> = {}) =>
  advectionStudy({ team: "calling-group", ...input });

const post = (toSend = study(), viewer: Account | null = author, options: MultipartRequestOptions = {}) =>
  callRoute(submissionsRoute.action, multipartRequest(submissionParts(toSend.part, toSend.files), options), {
    viewer,
  });

describe("POST /submissions", () => {
  it("answers 201 with id, state and address, and the address answers", async () => {
    const response = await post();
    expect(response.status).toBe(201);
    const { id, state, url } = await response.json();
    expect([state, url]).toEqual(["checking", `/api/v1/submissions/${id}`]);
    expect(response.headers.get("Location")).toBe(url);
    const shown = await callRoute(submission.loader, get(`/submissions/${id}`), {
      params: { id },
      viewer: author,
    });
    expect(await shown.json()).toMatchObject({
      id,
      state: "checking",
      problem: "advection-exp-sine",
      revision: 1,
    });
  });

  it.each([
    ["a visitor", null, 401],
    ["an account that is not verified", "unverified", 403],
    ["somebody who is not of the team", "stranger", 403],
  ])("answers %s with problem+json and keeps nothing", async (_who, who, status) => {
    const before = await storedKeys();
    const viewer =
      who === null ? null : who === "stranger" ? stranger : { ...author, isEmailVerified: false };
    const response = await post(study(), viewer);
    expect(response.status).toBe(status);
    expect(response.headers.get("Content-Type")).toBe("application/problem+json");
    expect(await response.json()).toMatchObject({
      status,
      title: expect.any(String),
      detail: expect.any(String),
    });
    expect(await storedKeys()).toEqual(before);
  });

  it.each<[string, () => Promise<Response>, number]>([
    [
      "a connection that breaks off",
      () => post(study(), author, { breaksOff: true, isTruncated: true }),
      422,
    ],
    ["a body that ends early", () => post(study(), author, { isTruncated: true }), 422],
    ["a part that does not fit", () => post({ ...study(), part: { ...study().part, runs: [] } }), 422],
    [
      "a file that no run names",
      () => post({ ...study(), files: { ...study().files, "x.npz": new Uint8Array(9) } }),
      422,
    ],
    [
      "a file above the limit",
      () => post({ ...study(), files: { "n0016.npz": new Uint8Array(64 * 2 ** 20 + 1) } }),
      413,
    ],
  ])("leaves neither rows nor stored bytes after %s", async (_what, send, status) => {
    const before = [await storedKeys(), await db.$count(submissions), await db.$count(files)];
    expect((await send()).status).toBe(status);
    expect([await storedKeys(), await db.$count(submissions), await db.$count(files)]).toEqual(before);
  });

  it("names in findings what is wrong, with file and place", async () => {
    const toSend = study();
    toSend.part.runs[0].file = "missing.npz";
    const body = await (await post(toSend)).json();
    expect(body.findings).toContainEqual({
      code: "files/missing",
      message: expect.stringContaining("missing.npz"),
      file: "missing.npz",
      where: "runs[0]",
    });
  });

  it("scores a dry run and stores nothing, not even a new solver", async () => {
    const before = [await storedKeys(), await db.$count(submissions), await db.$count(solvers)];
    const address = "http://127.0.0.1/api/v1/submissions?dryRun=true";
    const response = await post(study({ solver: "only-tried" }), author, { address });
    expect(response.status).toBe(200);
    expect(await response.json()).toMatchObject({ dryRun: true, study: { kind: "algebraic" } });
    expect([await storedKeys(), await db.$count(submissions), await db.$count(solvers)]).toEqual(before);
  });
});

describe("a submission that is not listed", () => {
  it("answers 404 to everyone else on every address that names it", async () => {
    const id = await submitForReview(author, study({ solver: "hidden" }));
    const { runs } = await getSubmission(author, id);
    for (const viewer of [null, stranger]) {
      const answers = await Promise.all([
        callRoute(submission.loader, get(`/submissions/${id}`), { params: { id }, viewer }),
        callRoute(progress.loader, get(`/submissions/${id}/progress`), { params: { id }, viewer }),
        callRoute(file.loader, get("/file"), { params: { id, runId: runs[0].id }, viewer }),
      ]);
      expect(answers.map((answer) => answer.status)).toEqual([404, 404, 404]);
    }
    const byStranger = await callRoute(handIn.action, postJson("/x", {}), {
      params: { id },
      viewer: stranger,
    });
    expect(byStranger.status).toBe(404);
  });
});

describe("decisions by the API", () => {
  it("list, answer 409 the second time, and show the record at its permanent address", async () => {
    const id = await submitForReview(author, study({ solver: "by-api" }));
    const list = () =>
      callRoute(listRoute.action, postJson("/x", { note: "Good." }), { params: { id }, viewer: admin });
    const { record: address } = await (await list()).json();
    expect((await list()).status).toBe(409);
    const params = { number: String(address.number), version: String(address.version) };
    const shown = await callRoute(record.loader, get("/records"), { params });
    expect(await shown.json()).toMatchObject({ id, record: address, state: "listed", supersededBy: null });
  });

  it("return, withdraw and hand in with the state they lead to", async () => {
    const id = await submitForReview(author, study({ solver: "to-and-fro" }));
    const params = { id };
    const returned = await callRoute(returnRoute.action, postJson("/x", { note: "Why?" }), {
      params,
      viewer: admin,
    });
    expect(await returned.json()).toEqual({ id, state: "returned" });
    const again = await callRoute(handIn.action, postJson("/x", {}), { params, viewer: author });
    expect(await again.json()).toEqual({ id, state: "inReview" });
    await callRoute(listRoute.action, postJson("/x", { note: "Good." }), { params, viewer: admin });
    const gone = await callRoute(withdraw.action, postJson("/x", { note: "Wrong." }), {
      params,
      viewer: author,
    });
    expect(await gone.json()).toEqual({ id, state: "withdrawn" });
  });

  it("ask who calls before they look at the note", async () => {
    const id = await submitForReview(author, study({ solver: "noteless" }));
    const list = (viewer: Account | null) =>
      callRoute(listRoute.action, postJson("/x", {}), { params: { id }, viewer });
    expect((await list(null)).status).toBe(401);
    expect((await list(author)).status).toBe(403);
    expect((await list(admin)).status).toBe(422);
  });
});

describe("GET /problems/{slug}/ranking", () => {
  const rank = (search: string, headers: Record<string, string> = {}) =>
    callRoute(ranking.loader, get(`/problems/advection-exp-sine/ranking${search}`, headers), {
      params: { slug: "advection-exp-sine" },
    });

  it("has the fields of the contract, rows by nodes and the rest under notReached", async () => {
    await submitAndList(author, admin, study({ solver: "ranked-low", order: 2 }));
    await submitAndList(author, admin, study({ solver: "ranked-high", order: 8, nodes: [8, 16, 32, 64] }));
    const body = await (await rank("?tolerance=1e-9")).json();
    expect(body).toMatchObject({
      problem: "advection-exp-sine",
      revision: 1,
      tolerance: 1e-9,
      norm: "l2",
      measure: "nodes",
    });
    expect(Object.keys(body.rows[0])).toEqual(
      expect.arrayContaining(
        "rank position submission record solver team family formalOrder observed nodes atMost errorAtReading cost".split(
          " ",
        ),
      ),
    );
    expect(Object.keys(body.rows[0].observed).sort()).toEqual(["kind", "order", "rate", "verdict"]);
    const nodes = body.rows.map((row: { nodes: number }) => row.nodes);
    expect(nodes).toEqual([...nodes].sort((a, b) => a - b));
    expect(body.notReached.map((row: { solver: { slug: string } }) => row.solver.slug)).toContain(
      "ranked-low",
    );
    expect(body.nextCursor).toBeNull();
  });

  it("answers 304 to its ETag, CSV on demand and 422 with the parameter's name", async () => {
    const etag = (await rank("")).headers.get("ETag") ?? "";
    expect((await rank("", { "If-None-Match": etag })).status).toBe(304);
    const csv = await (await rank("?tolerance=1e-9", { Accept: "text/csv" })).text();
    expect(csv.split("\r\n")[0]).toMatch(/^rank,position,submission,record,/);
    const refused = await rank("?norm=l7");
    expect(refused.status).toBe(422);
    expect((await refused.json()).findings).toMatchObject([{ where: "norm" }]);
  });
});

describe("a stored file", () => {
  it("comes whole or by ranges, immutable, as an attachment that no browser interprets", async () => {
    const toSend = study({ solver: "downloaded" });
    const { id } = await submitAndList(author, admin, toSend);
    const [run] = (await getSubmission(null, id)).runs;
    const params = { id, runId: run.id };
    const whole = await callRoute(file.loader, get("/f"), { params });
    const bytes = Buffer.from(await whole.arrayBuffer());
    expect(bytes.equals(Buffer.from(toSend.files[run.file.name]))).toBe(true);
    expect(whole.headers.get("Content-Disposition")).toMatch(/^attachment; filename="n0016.npz"/);
    expect(whole.headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(whole.headers.get("Cache-Control")).toBe("public, max-age=31536000, immutable");
    expect(whole.headers.get("ETag")).toBe(`"${run.file.sha256}"`);

    const part = await callRoute(file.loader, get("/f", { Range: "bytes=10-19" }), { params });
    expect([part.status, part.headers.get("Content-Range")]).toEqual([206, `bytes 10-19/${bytes.length}`]);
    expect(Buffer.from(await part.arrayBuffer())).toEqual(bytes.subarray(10, 20));
    const beyond = await callRoute(file.loader, get("/f", { Range: `bytes=${bytes.length}-` }), { params });
    expect([beyond.status, beyond.headers.get("Content-Range")]).toEqual([416, `bytes */${bytes.length}`]);
    const other = { id: "00000000-0000-4000-8000-000000000000", runId: run.id };
    expect((await callRoute(file.loader, get("/f"), { params: other })).status).toBe(404);
  });
});

describe("GET /submissions/{id}/progress", () => {
  it("sends the state now and each scored run until the submission is scored", async () => {
    const { id } = await (await post(study({ solver: "followed" }))).json();
    const leaving = new AbortController();
    const request = new Request(`http://127.0.0.1/api/v1/submissions/${id}/progress`, {
      signal: leaving.signal,
    });
    const response = await callRoute(progress.loader, request, { params: { id }, viewer: author });
    expect(response.headers.get("Content-Type")).toBe("text/event-stream");
    expect(response.headers.get("Cache-Control")).toBe("no-cache, no-transform");
    const reader = response.body?.pipeThrough(new TextDecoderStream()).getReader();
    if (!reader) throw new Error("The answer has no body.");
    const first = await reader.read();
    expect(first.value).toBe(
      'event: progress\ndata: {"state":"checking","runs":4,"scored":0,"refused":0}\n\n',
    );
    const scoring = scoreStoredSubmission(id);
    let text = "";
    while (!text.includes('"state":"scored"')) text += (await reader.read()).value ?? "";
    expect(text).toContain('"scored":4');
    leaving.abort();
    expect((await reader.read()).done).toBe(true);
    await scoring;
  });
});
