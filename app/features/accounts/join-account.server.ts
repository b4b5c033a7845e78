import { eq } from "drizzle-orm";
import { users } from "@/drizzle/schema";
import { type Transaction, db } from "@/app/platform/db.server";
import { hashPassword } from "@/app/platform/password.server";
import { enqueue } from "@/app/platform/queue.server";
import type { JoinInput } from "./account-form";
import { alreadyJoinedMail, verificationMail } from "./account-mail.server";
import { countMail } from "./mail-limits.server";
import { issueLink } from "./one-use-links.server";

/**
 * Makes an account and mails its verification link.
 *
 * A known address gets the same answer after the same work: only the mail differs. The id is null then, and
 * must not reach the person who asked.
 */
export async function joinAccount(
  input: JoinInput & { address?: string | null },
): Promise<{ userId: string | null }> {
  await countMail(input.email, input.address ?? null);
  const passwordHash = await hashPassword(input.password);
  return db.transaction(async (tx) => {
    const [created] = await tx
      .insert(users)
      .values({ email: input.email, name: input.name, passwordHash })
      .onConflictDoNothing({ target: users.email })
      .returning({ id: users.id });
    if (created) {
      const secret = await issueLink(tx, created.id, "verifyEmail");
      await enqueue(tx, "send-mail", verificationMail(input.email, secret));
      return { userId: created.id };
    }
    await mailKnownAddress(tx, input.email);
    return { userId: null };
  });
}

async function mailKnownAddress(tx: Transaction, email: string): Promise<void> {
  const [user] = await tx.select({ id: users.id }).from(users).where(eq(users.email, email));
  const secret = await issueLink(tx, user.id, "resetPassword");
  await enqueue(tx, "send-mail", alreadyJoinedMail(email, secret));
}
