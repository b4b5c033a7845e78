import { beforeAll, describe, expect, it } from "vitest";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { db } from "@/app/platform/db.server";
import * as problem from "@/app/routes/api/problem";
import * as problems from "@/app/routes/api/problems";
import * as score from "@/app/routes/api/score";
import { files, submissions } from "@/drizzle/schema";
import { callRoute, get } from "../support/call-route";
import { useDatabase } from "../support/database";
import { multipartRequest, submissionParts } from "../support/multipart";
import { advectionStudy } from "../support/register";
import { storedKeys } from "../support/storage";

useDatabase();

beforeAll(async () => {
  await publishShippedProblems();
});

const grid = { x: { kind: "uniform-periodic" } };

function post(files: Record<string, Uint8Array>, part: Record<string, unknown> = {}) {
  const runs = Object.keys(files).map((file) => ({ file, n: [Number(file.slice(1, 5))] }));
  const submission = { problem: "advection-exp-sine", grid, runs, ...part };
  return callRoute(score.action, multipartRequest(submissionParts(submission, files)));
}

describe("POST /score", () => {
  const { files: studyFiles } = advectionStudy({ team: "nobody", order: 4 });

  it("scores without an account, runs in the order sent, and stores nothing", async () => {
    const before = [await storedKeys(), await db.$count(submissions), await db.$count(files)];
    const response = await post(studyFiles);
    expect(response.status).toBe(200);
    const body = await response.json();
    expect(body).toMatchObject({
      problem: "advection-exp-sine",
      revision: 1,
      scorer: expect.stringMatching(/^\d/),
    });
    expect(body.runs.map((run: { n: number[] }) => run.n)).toEqual([[16], [32], [64], [128]]);
    expect(Object.keys(body.runs[0])).toEqual(
      expect.arrayContaining(["n", "nodes", "unknowns", "times", "massDefect", "boundary", "takacs"]),
    );
    expect(body.runs[0].times).toMatchObject([{ t: 3, between: null, components: null }]);
    expect(Object.keys(body.runs[0].times[0].nodes).sort()).toEqual([
      "l1",
      "l2",
      "max",
      "relL1",
      "relL2",
      "relMax",
    ]);
    expect(body.study).toMatchObject({ norm: "relL2", measure: "nodes", kind: "algebraic", verdict: "none" });
    expect(body.study.order).toBeCloseTo(4, 6);
    expect(body.studies.map((study: { norm: string }) => study.norm).sort()).toEqual([
      "relL1",
      "relL2",
      "relMax",
    ]);
    expect([await storedKeys(), await db.$count(submissions), await db.$count(files)]).toEqual(before);
  });

  it("judges a claim that is sent along", async () => {
    const body = await (await post(studyFiles, { claim: { kind: "algebraic", order: 4 } })).json();
    expect(body.study.verdict).toBe("confirmed");
  });

  it("answers 422 with every refused file, its code and its place", async () => {
    const broken = {
      ...studyFiles,
      "n0016.npz": studyFiles["n0016.npz"].slice(0, 90),
      "n0032.npz": Buffer.from("x"),
    };
    const response = await post(broken);
    expect(response.status).toBe(422);
    expect(response.headers.get("Content-Type")).toBe("application/problem+json");
    const body = await response.json();
    expect(body).toMatchObject({ status: 422, type: expect.any(String), title: expect.any(String) });
    expect(body.findings.map((finding: { file: string }) => finding.file)).toEqual([
      "n0016.npz",
      "n0032.npz",
    ]);
    for (const finding of body.findings)
      expect(Object.keys(finding).sort()).toEqual(["code", "file", "message", "where"]);
  });

  it.each([
    ["an unknown problem", { problem: "no-such-problem" }, 404],
    ["an unknown grid", { grid: { x: { kind: "hexagonal" } } }, 422],
    ["a grid that the problem does not allow", { grid: { x: { kind: "uniform" } } }, 422],
    ["a run without nodes", { runs: [{ file: "n0016.npz" }] }, 422],
    ["a claim without an order", { claim: { kind: "algebraic" } }, 422],
  ])("refuses %s", async (_what, part, status) => {
    expect((await post(studyFiles, part)).status).toBe(status);
  });
});

describe("GET /problems", () => {
  it("answers the catalogue as items with a cursor, and as CSV", async () => {
    const body = await (await callRoute(problems.loader, get("/problems"))).json();
    expect(body.nextCursor).toBeNull();
    expect(body.items[0]).toMatchObject({ slug: expect.any(String), code: "P-01", revision: 1, records: 0 });
    const csv = await (await callRoute(problems.loader, get("/problems?format=csv"))).text();
    expect(csv.trim().split("\r\n")).toHaveLength(body.items.length + 1);
  });

  it("answers a problem with its definition and proof, and 404 with problem+json for others", async () => {
    const params = { slug: "advection-exp-sine" };
    const body = await (await callRoute(problem.loader, get("/problems/x"), { params })).json();
    expect(body).toMatchObject({
      slug: "advection-exp-sine",
      definition: { outputTimes: [3] },
      proof: { holds: true },
    });
    const missing = await callRoute(problem.loader, get("/problems/x"), { params: { slug: "x" } });
    expect(missing.status).toBe(404);
    expect(await missing.json()).toMatchObject({ status: 404 });
  });
});
