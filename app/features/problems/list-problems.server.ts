import { and, asc, eq, sql } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import type { BoundaryCondition, ProblemDefinition } from "@/benchmarks/problems/definition";
import { typesetProblem } from "@/benchmarks/problems/typeset";
import type { MethodFamily } from "@/drizzle/enums";
import { marks, problemRevisions, problems, solvers, solverVersions, submissions } from "@/drizzle/schema";
import type { ProblemSummary } from "./problem-view";

/** k of the tolerance 10^(-k/2) at which the catalogue quotes the best record: 1e-6. */
const bestToleranceStep = 12;

/** The catalogue: every problem with a published revision, by code. */
export async function listProblems(): Promise<ProblemSummary[]> {
  const [published, counts, best] = await Promise.all([publishedRevisions(), countRecords(), findBest()]);
  return published.map(({ revisionId, slug, code, number, definition }) => {
    const counted = counts.get(revisionId);
    return {
      slug,
      code,
      title: definition.title,
      classification: definition.classification,
      axes: definition.axes,
      boundaryKinds: boundaryKindsOf(definition),
      equationsLatex: equationsOf(revisionId, definition),
      revision: number,
      records: counted?.records ?? 0,
      families: counted?.families ?? [],
      best: best.get(revisionId) ?? null,
    };
  });
}

async function publishedRevisions() {
  return await db
    .select({
      revisionId: problemRevisions.id,
      slug: problems.slug,
      code: problems.code,
      number: problemRevisions.number,
      definition: problemRevisions.definition,
    })
    .from(problemRevisions)
    .innerJoin(problems, eq(problems.id, problemRevisions.problemId))
    .where(eq(problemRevisions.state, "published"))
    // Periodic before bounded, as the sheets on the front page are laid out.
    .orderBy(sql`left(${problems.code}, 1) desc`, asc(problems.code));
}

async function countRecords() {
  const rows = await db
    .select({
      revisionId: submissions.problemRevisionId,
      records: sql<number>`count(*)::int`,
      families: sql<MethodFamily[]>`array_agg(distinct ${solvers.family}::text)`,
    })
    .from(submissions)
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(solvers, eq(solvers.id, solverVersions.solverId))
    .where(eq(submissions.state, "listed"))
    .groupBy(submissions.problemRevisionId);
  return new Map(rows.map((row) => [row.revisionId, row]));
}

async function findBest() {
  const rows = await db
    .selectDistinctOn([marks.problemRevisionId], {
      revisionId: marks.problemRevisionId,
      nodes: marks.nodes,
      atMost: marks.isAtMost,
    })
    .from(marks)
    .where(
      and(
        marks.isListed,
        eq(marks.norm, "relL2"),
        eq(marks.measure, "nodes"),
        eq(marks.toleranceStep, bestToleranceStep),
      ),
    )
    .orderBy(marks.problemRevisionId, asc(marks.nodes));
  return new Map(rows.map(({ revisionId, nodes, atMost }) => [revisionId, { nodes, atMost }]));
}

function boundaryKindsOf(definition: ProblemDefinition): BoundaryCondition["kind"][] {
  return [...new Set(definition.boundaryConditions.map((condition) => condition.kind))].sort();
}

/** A published revision never changes, so its typeset equations are kept. */
const equationsByRevision = new Map<string, string>();

function equationsOf(revisionId: string, definition: ProblemDefinition): string {
  const kept = equationsByRevision.get(revisionId);
  if (kept !== undefined) return kept;
  const { equations } = typesetProblem(definition);
  const latex =
    equations.length === 1 ? equations[0] : `\\begin{gathered}${equations.join(" \\\\ ")}\\end{gathered}`;
  equationsByRevision.set(revisionId, latex);
  return latex;
}
