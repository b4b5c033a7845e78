import { beforeAll, describe, expect, it } from "vitest";
import type { Account } from "@/app/features/accounts/viewer";
import { listProblems } from "@/app/features/problems/list-problems.server";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { rankProblem } from "@/app/features/rankings/rank-problem.server";
import { parseRankingQuery } from "@/app/features/rankings/ranking-query";
import { useDatabase } from "../../support/database";
import { advectionStudy, makeAccount, submitAndList } from "../../support/register";

useDatabase();

const ranking = (search = "") =>
  rankProblem(null, "advection-exp-sine", parseRankingQuery(new URLSearchParams(search)));

const solversOf = (rows: { solver: { slug: string } }[]) => rows.map((row) => row.solver.slug);

beforeAll(async () => {
  await publishShippedProblems();
  const author: Account = await makeAccount("author", "Ranked Group");
  const admin: Account = await makeAccount("admin");
  const list = (input: Omit<Parameters<typeof advectionStudy>[0], "team">) =>
    submitAndList(author, admin, advectionStudy({ team: "ranked-group", ...input }));
  await list({ solver: "second", order: 2 });
  await list({ solver: "second-twin", order: 2 });
  await list({ solver: "fourth", order: 4, nodes: [16, 32, 64, 128, 256] });
  await list({ solver: "eighth", order: 8, nodes: [8, 16, 32], family: "fourier" });
});

describe("the ranking of a problem", () => {
  it("lists the same submission at the same nodes as its study says, lower orders later or not at all", async () => {
    const { rows, notReached, total } = await ranking("tolerance=1e-4");
    expect(solversOf(rows)).toEqual(["eighth", "fourth", "second", "second-twin"]);
    expect(rows.map((row) => [row.rank, row.isTied, row.position])).toEqual([
      [1, false, 1],
      [2, false, 2],
      [3, true, 3],
      [3, true, 4],
    ]);
    expect([total, notReached]).toEqual([4, []]);
    const tight = await ranking("tolerance=1e-8");
    expect(solversOf(tight.rows)).toEqual(["eighth", "fourth"]);
    expect(tight.notReached.map((row) => [row.solver.slug, row.at])).toEqual([
      ["second", [128]],
      ["second-twin", [128]],
    ]);
    for (const row of tight.notReached) expect(row.smallestError).toBeGreaterThan(1e-8);
  });

  it("keeps the rank among all when a filter hides some, and counts positions within the filter", async () => {
    const { rows, total } = await ranking("tolerance=1e-4&formalOrder=2");
    expect(rows.map((row) => [row.solver.slug, row.rank, row.position])).toEqual([
      ["second", 3, 1],
      ["second-twin", 3, 2],
    ]);
    expect(total).toBe(2);
  });

  it.each([
    ["family=fourier", ["eighth"]],
    ["family=fourier&family=finiteDifference", ["eighth", "fourth", "second", "second-twin"]],
    ["minNodes=256", ["fourth"]],
    ["maxNodes=32", ["eighth"]],
    ["precision=float32", []],
    ["grid=uniform-periodic&formalOrder=4", ["fourth"]],
    ["grid=uniform", []],
    ["observedKind=exponential", []],
  ])("filters by %s", async (filter, expected) => {
    expect(solversOf((await ranking(`tolerance=1e-4&${filter}`)).rows)).toEqual(expected);
  });

  it("pages by a cursor without leaving out or repeating a row", async () => {
    const seen: string[] = [];
    let cursor: string | null = "";
    while (cursor !== null) {
      const page = await ranking(`tolerance=1e-4&limit=1&cursor=${cursor}`);
      expect(page.rows).toHaveLength(1);
      expect(page.rows[0].position).toBe(seen.length + 1);
      seen.push(...solversOf(page.rows));
      cursor = page.nextCursor;
    }
    expect(seen).toEqual(["eighth", "fourth", "second", "second-twin"]);
    await expect(ranking("cursor=nonsense")).rejects.toMatchObject({ kind: "invalid" });
  });

  it("draws a curve through the points of each submission", async () => {
    const { curves } = await ranking();
    const fourth = curves.find((curve) => curve.label.startsWith("fourth"));
    expect(fourth?.points.map((point) => point.nodes)).toEqual([16, 32, 64, 128, 256]);
    expect(fourth?.line.at(0)?.error).toBe(fourth?.points[0].error);
    expect(fourth?.line.at(-1)?.error).toBe(fourth?.points[4].error);
  });

  it("refuses a problem that does not exist", async () => {
    await expect(
      rankProblem(null, "no-such", parseRankingQuery(new URLSearchParams())),
    ).rejects.toMatchObject({
      kind: "notFound",
    });
  });
});

describe("the catalogue", () => {
  it("counts the records of each problem and quotes the fewest nodes for 1e-6", async () => {
    const problems = await listProblems();
    const problem = problems.find((candidate) => candidate.slug === "advection-exp-sine");
    const { rows } = await ranking("tolerance=1e-6");
    expect(problem).toMatchObject({ records: 4, families: ["finiteDifference", "fourier"] });
    expect(problem?.best).toEqual({ nodes: rows[0].nodes, atMost: rows[0].atMost });
    expect(
      problems.filter((other) => other.slug !== "advection-exp-sine").map((other) => other.best),
    ).toEqual(Array.from({ length: problems.length - 1 }, () => null));
  });

  it("has periodic problems before bounded ones, each in the order of its code", async () => {
    const codes = (await listProblems()).map((problem) => problem.code);
    const sorted = [...codes].sort((a, b) => (a[0] === b[0] ? a.localeCompare(b) : b[0].localeCompare(a[0])));
    expect(codes).toEqual(sorted);
  });
});
