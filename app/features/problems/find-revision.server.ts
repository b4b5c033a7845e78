import { and, eq } from "drizzle-orm";
import { db, type Transaction } from "@/app/platform/db.server";
import { notFound } from "@/app/platform/errors";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import { problemRevisions, problems } from "@/drizzle/schema";

export interface FoundRevision {
  problemId: string;
  revisionId: string;
  slug: string;
  code: string;
  number: number;
  isCurrent: boolean;
  definition: ProblemDefinition;
}

/** The named revision of a problem, or the published one; drafts are as good as absent. */
export async function findRevision(
  slug: string,
  number: number | null,
  executor: Transaction | typeof db = db,
): Promise<FoundRevision> {
  const rows = await executor
    .select({
      problemId: problems.id,
      revisionId: problemRevisions.id,
      slug: problems.slug,
      code: problems.code,
      number: problemRevisions.number,
      state: problemRevisions.state,
      definition: problemRevisions.definition,
    })
    .from(problems)
    .innerJoin(problemRevisions, eq(problemRevisions.problemId, problems.id))
    .where(
      and(
        eq(problems.slug, slug),
        number === null ? eq(problemRevisions.state, "published") : eq(problemRevisions.number, number),
      ),
    );
  const row = rows.find((candidate) => candidate.state !== "draft");
  if (!row)
    throw notFound(number === null ? `The problem ${slug}` : `Revision ${number} of the problem ${slug}`);
  const { state, ...revision } = row;
  return { ...revision, isCurrent: state === "published" };
}
