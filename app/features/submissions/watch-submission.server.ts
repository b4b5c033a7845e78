import { eq, sql } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { subscribe } from "@/app/platform/events.server";
import { notFound } from "@/app/platform/errors";
import type { SubmissionState } from "@/drizzle/enums";
import { runs, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { findGuarded } from "./find-guarded.server";

export interface Progress {
  state: SubmissionState;
  runs: number;
  scored: number;
  refused: number;
}

/**
 * What follows the progress of a submission: now and after each change, until its signal aborts. An event only says that something
 * changed; what is reported is read anew, so that neither a lost event nor their order can make it wrong.
 */
export async function watchSubmission(
  viewer: Viewer,
  id: string,
): Promise<(signal: AbortSignal) => AsyncGenerator<Progress>> {
  const guarded = await findGuarded(viewer, id);
  return (signal) => followProgress(guarded.id, signal);
}

async function* followProgress(submissionId: string, signal: AbortSignal): AsyncGenerator<Progress> {
  let isStale = true;
  let wake: () => void = () => undefined;
  const unsubscribe = subscribe(submissionId, () => {
    isStale = true;
    wake();
  });
  const leave = () => wake();
  signal.addEventListener("abort", leave);
  let lastReported = "";
  try {
    while (!signal.aborted) {
      if (isStale) {
        isStale = false;
        const now = await readProgress(submissionId);
        const text = JSON.stringify(now);
        if (text !== lastReported) yield now;
        lastReported = text;
      } else {
        await new Promise<void>((resolve) => (wake = resolve));
      }
    }
  } finally {
    signal.removeEventListener("abort", leave);
    unsubscribe();
  }
}

async function readProgress(submissionId: string): Promise<Progress> {
  const count = (state: "scored" | "refused") =>
    sql<number>`count(*) filter (where ${runs.state} = ${state})::int`;
  const [row] = await db
    .select({
      state: submissions.state,
      runs: sql<number>`count(${runs.id})::int`,
      scored: count("scored"),
      refused: count("refused"),
    })
    .from(submissions)
    .leftJoin(runs, eq(runs.submissionId, submissions.id))
    .where(eq(submissions.id, submissionId))
    .groupBy(submissions.id);
  if (!row) throw notFound("The submission");
  return row;
}
