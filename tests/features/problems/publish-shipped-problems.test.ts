import { describe, expect, it } from "vitest";
import { getProblem } from "@/app/features/problems/get-problem.server";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { db } from "@/app/platform/db.server";
import { shippedProblems } from "@/benchmarks/problems/catalogue";
import { problemRevisions } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";

useDatabase();

describe("publishing the shipped problems", () => {
  it("publishes each once with its proof, also when two processes start together and again later", async () => {
    const [first, second] = await Promise.all([publishShippedProblems(), publishShippedProblems()]);
    const slugs = shippedProblems.map((problem) => problem.slug);
    expect([...first.published, ...second.published].sort()).toEqual([...slugs].sort());
    expect(await publishShippedProblems()).toEqual({ published: [] });
    expect(await db.$count(problemRevisions)).toBe(slugs.length);
  });

  it("keeps the definition exactly as it is shipped", async () => {
    for (const shipped of shippedProblems) {
      const problem = await getProblem(shipped.slug);
      expect(problem.definition).toEqual(JSON.parse(JSON.stringify(shipped)));
      expect(problem).toMatchObject({ revision: 1, isCurrent: true, proof: { holds: true } });
    }
  });

  it("knows nothing of other slugs and revisions", async () => {
    await expect(getProblem("no-such-problem")).rejects.toMatchObject({ kind: "notFound" });
    await expect(getProblem(shippedProblems[0].slug, 2)).rejects.toMatchObject({ kind: "notFound" });
    await expect(getProblem(shippedProblems[0].slug, Number.NaN)).rejects.toMatchObject({ kind: "notFound" });
  });
});
