import { eq } from "drizzle-orm";
import { z } from "zod";
import { db } from "@/app/platform/db.server";
import { notFound } from "@/app/platform/errors";
import { submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { canSee } from "./submission-policy";

/** What the rules need of a submission; one that the viewer may not see does not exist. */
export async function findGuarded(viewer: Viewer, id: string) {
  const [row] = z.uuid().safeParse(id).success
    ? await db
        .select({ id: submissions.id, state: submissions.state, teamId: submissions.teamId })
        .from(submissions)
        .where(eq(submissions.id, id))
    : [];
  if (!row || !canSee(viewer, row)) throw notFound("The submission");
  return row;
}
