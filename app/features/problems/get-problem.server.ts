import { and, desc, eq, ne } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { notFound } from "@/app/platform/errors";
import { typesetProblem } from "@/benchmarks/problems/typeset";
import { problemRevisions, problems } from "@/drizzle/schema";
import type { ProblemView } from "./problem-view";

/** A problem at its current revision, or at the one named; a retired one says that it is not current. */
export async function getProblem(slug: string, revision: number | null = null): Promise<ProblemView> {
  const rows = await db
    .select({
      slug: problems.slug,
      code: problems.code,
      number: problemRevisions.number,
      state: problemRevisions.state,
      definition: problemRevisions.definition,
      proof: problemRevisions.proof,
      publishedAt: problemRevisions.publishedAt,
      whatChanged: problemRevisions.whatChanged,
    })
    .from(problems)
    .innerJoin(problemRevisions, eq(problemRevisions.problemId, problems.id))
    .where(and(eq(problems.slug, slug), ne(problemRevisions.state, "draft")))
    .orderBy(desc(problemRevisions.number));
  // Where all revisions are retired, the newest stands for the problem.
  const chosen =
    revision === null
      ? (rows.find((row) => row.state === "published") ?? rows[0])
      : rows.find((row) => row.number === revision);
  if (!chosen)
    throw notFound(revision === null ? `The problem ${slug}` : `Revision ${revision} of the problem ${slug}`);
  return {
    slug: chosen.slug,
    code: chosen.code,
    title: chosen.definition.title,
    revision: chosen.number,
    definition: chosen.definition,
    proof: chosen.proof,
    publishedAt: chosen.publishedAt,
    isCurrent: chosen.state === "published",
    typeset: typesetProblem(chosen.definition),
    revisions: rows.map(({ number, state, publishedAt, whatChanged }) => ({
      number,
      state,
      publishedAt,
      whatChanged,
    })),
  };
}
