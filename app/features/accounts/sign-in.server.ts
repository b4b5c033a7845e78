import { eq } from "drizzle-orm";
import { users } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import { hashPassword, verifyPassword } from "@/app/platform/password.server";
import { newSecret } from "@/app/platform/secrets.server";
import type { SignInInput } from "./account-form";
import { type ThrottleRule, countAttempt, forgetAttempts, takeBackAttempts } from "./throttle.server";

export const signInLimits = { byAccount: 10, byAddress: 50, windowSeconds: 15 * 60 };

/**
 * Whose credentials these are.
 *
 * An unknown address costs the same work as a wrong password and gets the same answer; so does a suspended
 * account. Failures are counted by account and by network address.
 */
export async function checkCredentials(
  input: SignInInput & { address: string | null },
): Promise<{ userId: string }> {
  const byAccount: ThrottleRule = {
    what: "sign-in by account",
    subject: input.email,
    limit: signInLimits.byAccount,
  };
  const rules = [byAccount];
  if (input.address !== null) {
    rules.push({ what: "sign-in by address", subject: input.address, limit: signInLimits.byAddress });
  }
  const counted = await countAttempt(rules, {
    windowSeconds: signInLimits.windowSeconds,
    message: "Too many failed sign-ins. Wait, then try again, or set a new password.",
  });

  const [user] = await db
    .select({ id: users.id, passwordHash: users.passwordHash, suspendedAt: users.suspendedAt })
    .from(users)
    .where(eq(users.email, input.email));
  const isRight = await verifyPassword(user?.passwordHash ?? (await hashOfNobody()), input.password);
  if (!user || !isRight || user.suspendedAt !== null) {
    throw invalid("The e-mail address or the password is not right.");
  }

  await takeBackAttempts(counted);
  await forgetAttempts(byAccount);
  return { userId: user.id };
}

let nobody: Promise<string> | null = null;

/** A hash with the present parameters that no password matches, made once a process. */
function hashOfNobody(): Promise<string> {
  nobody ??= hashPassword(newSecret());
  return nobody;
}
