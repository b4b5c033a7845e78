import { and, eq } from "drizzle-orm";
import { db, type Transaction } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import { nodesForTolerance } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { Finding, Study } from "@/benchmarks/scoring/result";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";
import { findings as findingRows, marks, studies as studyRows, submissions } from "@/drizzle/schema";
import { whyBetweenOnly } from "../rankings/between-only";
import type { StoredStudy } from "./stored-study.server";

/** Studies, findings, marks and the state `scored`, in one transaction; nothing where the state has moved on. */
export async function writeStudy(study: StoredStudy, studies: Study[], findings: Finding[]): Promise<void> {
  const { submissionId, revisionId: problemRevisionId } = study;
  await db.transaction(async (tx) => {
    const scored = await tx
      .update(submissions)
      .set({ state: "scored", scoredAt: new Date(), refusals: null })
      .where(and(eq(submissions.id, submissionId), eq(submissions.state, "checking")))
      .returning({ id: submissions.id });
    if (scored.length === 0) return;
    await tx
      .insert(studyRows)
      .values(
        studies.map((one) => ({
          submissionId,
          problemRevisionId,
          scorerVersion,
          norm: one.norm,
          measure: one.measure,
          study: one,
        })),
      )
      .onConflictDoNothing();
    await writeFindings(tx, study, findings);
    // What does not rank at the nodes has no marks there.
    const ranked = studies.filter(
      (one) => one.measure === "between" || whyBetweenOnly(findings, one) === null,
    );
    await writeMarks(tx, study, ranked);
    await publish(tx, { submissionId, kind: "state", state: "scored" });
  });
}

async function writeFindings(tx: Transaction, study: StoredStudy, findings: Finding[]): Promise<void> {
  const { submissionId, revisionId: problemRevisionId } = study;
  await tx
    .delete(findingRows)
    .where(and(eq(findingRows.submissionId, submissionId), eq(findingRows.scorerVersion, scorerVersion)));
  if (findings.length === 0) return;
  await tx
    .insert(findingRows)
    .values(findings.map((finding) => ({ submissionId, problemRevisionId, scorerVersion, ...finding })));
}

async function writeMarks(tx: Transaction, study: StoredStudy, studies: Study[]): Promise<void> {
  const { submissionId, revisionId: problemRevisionId, family } = study;
  const rows = studies.flatMap((one) =>
    one.marks.map((mark) => {
      const reading = nodesForTolerance(one, mark.tolerance);
      return {
        submissionId,
        problemRevisionId,
        norm: one.norm,
        measure: one.measure,
        toleranceStep: Math.round(-2 * Math.log10(mark.tolerance)),
        nodes: mark.nodes,
        isAtMost: mark.atMost,
        cost: reading.kind === "reached" ? reading.cost : null,
        family,
      };
    }),
  );
  await tx.delete(marks).where(eq(marks.submissionId, submissionId));
  if (rows.length > 0) await tx.insert(marks).values(rows);
}
