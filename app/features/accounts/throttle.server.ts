import { and, asc, eq, inArray, lt, sql } from "drizzle-orm";
import { signInAttempts } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { env } from "@/app/platform/env.server";
import { limitReached } from "@/app/platform/errors";
import { hashSecret } from "@/app/platform/secrets.server";

export interface ThrottleRule {
  /** What is counted, such as "sign-in by account". */
  what: string;
  /** Whose attempts: an e-mail address or a network address. Kept hashed only. */
  subject: string;
  limit: number;
}

export interface Throttle {
  windowSeconds: number;
  message: string;
}

/**
 * Counts one attempt against every rule, or refuses it against the first one whose limit is reached.
 *
 * The attempt is counted before it is made: requests sent at the same moment cannot pass the limit together.
 * Returns the ids of the counted attempts, so that a success can take them back.
 */
export async function countAttempt(rules: ThrottleRule[], throttle: Throttle): Promise<number[]> {
  const keyed = rules
    .map((rule) => ({ ...rule, hash: subjectHash(rule) }))
    // One order of locking for all, or two requests could wait for each other.
    .sort((a, b) => (a.hash < b.hash ? -1 : 1));
  return db.transaction(async (tx) => {
    const ids: number[] = [];
    for (const rule of keyed) {
      await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${rule.hash}, 0))`);
      const windowStart = new Date(Date.now() - throttle.windowSeconds * 1000);
      await tx
        .delete(signInAttempts)
        .where(and(eq(signInAttempts.subjectHash, rule.hash), lt(signInAttempts.createdAt, windowStart)));
      const attempts = await tx
        .select({ createdAt: signInAttempts.createdAt })
        .from(signInAttempts)
        .where(eq(signInAttempts.subjectHash, rule.hash))
        .orderBy(asc(signInAttempts.createdAt));
      if (attempts.length >= rule.limit) {
        const freed =
          attempts[attempts.length - rule.limit].createdAt.getTime() + throttle.windowSeconds * 1000;
        throw limitReached(throttle.message, Math.max(1, Math.ceil((freed - Date.now()) / 1000)));
      }
      const [row] = await tx
        .insert(signInAttempts)
        .values({ subjectHash: rule.hash })
        .returning({ id: signInAttempts.id });
      ids.push(row.id);
    }
    return ids;
  });
}

export async function takeBackAttempts(ids: number[]): Promise<void> {
  await db.delete(signInAttempts).where(inArray(signInAttempts.id, ids));
}

export async function forgetAttempts(rule: Pick<ThrottleRule, "what" | "subject">): Promise<void> {
  await db.delete(signInAttempts).where(eq(signInAttempts.subjectHash, subjectHash(rule)));
}

/** Keyed with the installation's secret: addresses are too few for a bare hash to hide them. */
function subjectHash(rule: Pick<ThrottleRule, "what" | "subject">): string {
  return hashSecret(`${env.SESSION_SECRET}\n${rule.what}\n${rule.subject}`);
}
