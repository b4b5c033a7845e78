import { and, eq, isNull } from "drizzle-orm";
import { z } from "zod";
import { apiKeys } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { notFound } from "@/app/platform/errors";
import type { Viewer } from "../accounts/viewer";
import { requireAccount } from "../accounts/viewer-policy";
import { recordAuditEvent } from "../moderation/record-audit-event.server";

export async function revokeApiKey(viewer: Viewer, id: string): Promise<void> {
  const account = requireAccount(viewer);
  if (!z.uuid().safeParse(id).success) throw notFound("This token");
  await db.transaction(async (tx) => {
    const [row] = await tx
      .update(apiKeys)
      .set({ revokedAt: new Date() })
      .where(and(eq(apiKeys.id, id), eq(apiKeys.userId, account.userId), isNull(apiKeys.revokedAt)))
      .returning({ id: apiKeys.id });
    if (!row) throw notFound("This token");
    await recordAuditEvent(tx, {
      actorId: account.userId,
      action: "apiKey.revoked",
      subjectKind: "apiKey",
      subjectId: row.id,
      detail: {},
    });
  });
}
