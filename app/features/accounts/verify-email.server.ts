import { eq, sql } from "drizzle-orm";
import { users } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { recordAuditEvent } from "../moderation/record-audit-event.server";
import { endLinks, redeemLink } from "./one-use-links.server";

export async function verifyEmail(secret: string): Promise<{ userId: string }> {
  return db.transaction(async (tx) => {
    const userId = await redeemLink(tx, secret, "verifyEmail");
    await tx
      .update(users)
      .set({ emailVerifiedAt: sql`coalesce(${users.emailVerifiedAt}, now())` })
      .where(eq(users.id, userId));
    await endLinks(tx, userId, "verifyEmail");
    await recordAuditEvent(tx, {
      actorId: userId,
      action: "account.verified",
      subjectKind: "account",
      subjectId: userId,
      detail: {},
    });
    return { userId };
  });
}
