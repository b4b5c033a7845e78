import { eq, sql } from "drizzle-orm";
import { users } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import { hashPassword } from "@/app/platform/password.server";
import { enqueue } from "@/app/platform/queue.server";
import { recordAuditEvent } from "../moderation/record-audit-event.server";
import { noAccountMail, resetMail } from "./account-mail.server";
import { countMail } from "./mail-limits.server";
import { endLinks, issueLink, redeemLink } from "./one-use-links.server";
import { passwordRefusal } from "./password-rules";
import { endAllSessions } from "./sessions.server";

/** Answers nothing, whether the address is known or not: in both cases a mail says what is the case. */
export async function requestReset(email: string, address: string | null = null): Promise<void> {
  await countMail(email, address);
  await db.transaction(async (tx) => {
    const [user] = await tx.select({ id: users.id }).from(users).where(eq(users.email, email));
    const mail = user
      ? resetMail(email, await issueLink(tx, user.id, "resetPassword"))
      : noAccountMail(email);
    await enqueue(tx, "send-mail", mail);
  });
}

/**
 * Sets a new password by a mailed link and ends every session and every other such link.
 *
 * The link proves that its reader owns the address, so the address counts as verified from then on.
 */
export async function resetPassword(secret: string, password: string): Promise<{ userId: string }> {
  const passwordHash = await hashPassword(password);
  return db.transaction(async (tx) => {
    const userId = await redeemLink(tx, secret, "resetPassword");
    const [user] = await tx
      .update(users)
      .set({ passwordHash, emailVerifiedAt: sql`coalesce(${users.emailVerifiedAt}, now())` })
      .where(eq(users.id, userId))
      .returning({ name: users.name, email: users.email });
    const refusal = passwordRefusal(password, user);
    // Thrown inside the transaction: the link stays usable for a better password.
    if (refusal !== null) throw invalid(refusal, { password: refusal });
    await endLinks(tx, userId, "resetPassword");
    await endLinks(tx, userId, "verifyEmail");
    await endAllSessions(tx, userId);
    await recordAuditEvent(tx, {
      actorId: userId,
      action: "account.passwordReset",
      subjectKind: "account",
      subjectId: userId,
      detail: {},
    });
    return { userId };
  });
}
