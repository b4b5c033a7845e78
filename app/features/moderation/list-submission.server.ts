import { and, desc, eq, isNotNull, sql } from "drizzle-orm";
import { db, type Transaction } from "@/app/platform/db.server";
import { publish } from "@/app/platform/events.server";
import { conflict } from "@/app/platform/errors";
import { marks, problemRevisions, solverVersions, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import type { RecordAddress } from "../submissions/submission-view";
import { requireNote } from "./decision-form";
import { recordDecision } from "./record-decision.server";
import { requireDecider } from "./require-decider.server";

/**
 * Makes a submission in review a record. Where the same solver has a record on the same problem and variant, the new
 * one takes its number with the next version, and the listed one is superseded.
 */
export async function listSubmission(
  viewer: Viewer,
  input: { id: string; note: string },
): Promise<{ id: string; record: RecordAddress }> {
  const { account, guarded } = await requireDecider(viewer, input.id);
  const note = requireNote(input.note);
  return await db.transaction(async (tx) => {
    const lineage = await lockLineage(tx, guarded.id);
    const record = await nextRecord(tx, lineage);
    const superseded = await supersede(tx, record.number);
    await makeListed(tx, guarded.id, record);
    await recordDecision(tx, {
      submissionId: guarded.id,
      kind: "list",
      note,
      decidedById: account.userId,
      state: "listed",
      detail: { record, superseded },
    });
    return { id: guarded.id, record };
  });
}

interface Lineage {
  solverId: string;
  problemId: string;
  variant: string;
}

/** Solver, problem and variant, held against another listing of the same until this transaction ends. */
async function lockLineage(tx: Transaction, submissionId: string): Promise<Lineage> {
  const [lineage] = await tx
    .select({
      solverId: solverVersions.solverId,
      problemId: problemRevisions.problemId,
      variant: submissions.variant,
    })
    .from(submissions)
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(problemRevisions, eq(problemRevisions.id, submissions.problemRevisionId))
    .where(eq(submissions.id, submissionId));
  const name = `record ${lineage.solverId} ${lineage.problemId} ${lineage.variant}`;
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${name}, 0))`);
  return lineage;
}

async function nextRecord(tx: Transaction, lineage: Lineage): Promise<RecordAddress> {
  const [newest] = await tx
    .select({ number: submissions.recordNumber, version: submissions.recordVersion })
    .from(submissions)
    .innerJoin(solverVersions, eq(solverVersions.id, submissions.solverVersionId))
    .innerJoin(problemRevisions, eq(problemRevisions.id, submissions.problemRevisionId))
    .where(
      and(
        eq(solverVersions.solverId, lineage.solverId),
        eq(problemRevisions.problemId, lineage.problemId),
        eq(submissions.variant, lineage.variant),
        isNotNull(submissions.recordNumber),
      ),
    )
    .orderBy(desc(submissions.recordVersion))
    .limit(1);
  if (newest && newest.number !== null && newest.version !== null) {
    return { number: newest.number, version: newest.version + 1 };
  }
  const { rows } = await tx.execute<{ number: number }>(sql`select nextval('record_numbers')::int as number`);
  return { number: rows[0].number, version: 1 };
}

async function supersede(tx: Transaction, recordNumber: number): Promise<string | null> {
  const [superseded] = await tx
    .update(submissions)
    .set({ state: "superseded" })
    .where(and(eq(submissions.recordNumber, recordNumber), eq(submissions.state, "listed")))
    .returning({ id: submissions.id });
  if (!superseded) return null;
  await tx.update(marks).set({ isListed: false }).where(eq(marks.submissionId, superseded.id));
  await publish(tx, { submissionId: superseded.id, kind: "state", state: "superseded" });
  return superseded.id;
}

async function makeListed(tx: Transaction, submissionId: string, record: RecordAddress): Promise<void> {
  const listed = await tx
    .update(submissions)
    .set({
      state: "listed",
      recordNumber: record.number,
      recordVersion: record.version,
      listedAt: new Date(),
    })
    .where(and(eq(submissions.id, submissionId), eq(submissions.state, "inReview")))
    .returning({ id: submissions.id });
  if (listed.length === 0)
    throw conflict("The submission is not in review any more: somebody else has decided.");
  await tx.update(marks).set({ isListed: true }).where(eq(marks.submissionId, submissionId));
}
