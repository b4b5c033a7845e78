import { createHash } from "node:crypto";
import { and, eq, lt, sql } from "drizzle-orm";
import type { Transaction } from "@/app/platform/db.server";
import { conflict } from "@/app/platform/errors";
import { idempotencyKeys } from "@/drizzle/schema";

/** What decides whether a repeated key carries the same request. */
export function bodyHashOf(part: unknown, files: { name: string; sha256: string }[]): string {
  const names = files.map(({ name, sha256 }) => [name, sha256]).sort(([a], [b]) => (a < b ? -1 : 1));
  return createHash("sha256")
    .update(JSON.stringify([part, names]))
    .digest("hex");
}

/**
 * Claims an Idempotency-Key for 24 hours within the caller's transaction. Returns null where the request is new,
 * the kept answer where it is a repeat; a second request with the key waits until the first has committed.
 */
export async function claimIdempotencyKey(
  tx: Transaction,
  apiKeyId: string,
  key: string,
  bodyHash: string,
): Promise<{ body: unknown } | null> {
  const mine = and(eq(idempotencyKeys.apiKeyId, apiKeyId), eq(idempotencyKeys.key, key));
  await tx
    .delete(idempotencyKeys)
    .where(and(mine, lt(idempotencyKeys.createdAt, sql`now() - interval '24 hours'`)));
  const claimed = await tx
    .insert(idempotencyKeys)
    .values({ apiKeyId, key, bodyHash })
    .onConflictDoNothing()
    .returning({ key: idempotencyKeys.key });
  if (claimed.length > 0) return null;
  const [earlier] = await tx
    .select({ bodyHash: idempotencyKeys.bodyHash, answer: idempotencyKeys.answer })
    .from(idempotencyKeys)
    .where(mine);
  if (!earlier?.answer || earlier.bodyHash !== bodyHash) {
    throw conflict(
      "This Idempotency-Key was used with a different request. Use a new key for a new submission.",
    );
  }
  return { body: earlier.answer.body };
}

export async function keepIdempotentAnswer(
  tx: Transaction,
  apiKeyId: string,
  key: string,
  answer: { status: number; body: unknown },
): Promise<void> {
  await tx
    .update(idempotencyKeys)
    .set({ answer })
    .where(and(eq(idempotencyKeys.apiKeyId, apiKeyId), eq(idempotencyKeys.key, key)));
}
