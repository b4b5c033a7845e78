import { eq, sql } from "drizzle-orm";
import { logger } from "@/app/platform/logger.server";
import { db } from "@/app/platform/db.server";
import { shippedProblems } from "@/benchmarks/problems/catalogue";
import { proveConsistency } from "@/benchmarks/problems/consistency-proof";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import { problemRevisions, problems } from "@/drizzle/schema";

/**
 * Puts the shipped problems that the register lacks into it as revision 1, each with its proof.
 * A problem that exists is left alone: from then on its revisions are the maintainers'.
 */
export async function publishShippedProblems(): Promise<{ published: string[] }> {
  const known = new Set((await db.select({ slug: problems.slug }).from(problems)).map((row) => row.slug));
  const published: string[] = [];
  for (const definition of shippedProblems) {
    if (known.has(definition.slug)) continue;
    if (await publishShipped(definition)) published.push(definition.slug);
  }
  if (published.length > 0) logger.info("published shipped problems", { slugs: published });
  return { published };
}

async function publishShipped(definition: ProblemDefinition): Promise<boolean> {
  const proof = proveConsistency(definition);
  if (!proof.holds) {
    const broken = proof.checks.filter((check) => !check.holds).map((check) => check.label);
    throw new Error(`The shipped problem ${definition.slug} is not consistent: ${broken.join("; ")}.`);
  }
  return await db.transaction(async (tx) => {
    // Two processes may start at once; the second waits and finds the first one's rows.
    await tx.execute(sql`select pg_advisory_xact_lock(hashtext('publish-shipped-problems'))`);
    const existing = await tx
      .select({ id: problems.id })
      .from(problems)
      .where(eq(problems.slug, definition.slug));
    if (existing.length > 0) return false;
    const [problem] = await tx
      .insert(problems)
      .values({ slug: definition.slug, code: definition.code })
      .returning({ id: problems.id });
    await tx.insert(problemRevisions).values({
      problemId: problem.id,
      number: 1,
      state: "published",
      definition,
      proof,
      whatChanged: "First published.",
      publishedAt: new Date(),
    });
    return true;
  });
}
