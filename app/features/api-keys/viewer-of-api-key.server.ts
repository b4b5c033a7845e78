import { and, eq, gt, isNull, or } from "drizzle-orm";
import { apiKeys } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { hashSecret } from "@/app/platform/secrets.server";
import { loadAccount } from "../accounts/load-account.server";
import type { Viewer } from "../accounts/viewer";

const lastUsedStepMs = 60_000;

/** Null for a token that is unknown, expired or revoked, or whose account is suspended. */
export async function viewerOfApiKey(secret: string): Promise<Viewer> {
  const now = new Date();
  const [key] = await db
    .select({
      id: apiKeys.id,
      userId: apiKeys.userId,
      scopes: apiKeys.scopes,
      lastUsedAt: apiKeys.lastUsedAt,
    })
    .from(apiKeys)
    .where(
      and(
        eq(apiKeys.secretHash, hashSecret(secret)),
        isNull(apiKeys.revokedAt),
        or(isNull(apiKeys.expiresAt), gt(apiKeys.expiresAt, now)),
      ),
    );
  if (!key) return null;
  const account = await loadAccount(key.userId, { scopes: key.scopes, apiKeyId: key.id });
  if (account === null) return null;
  // By the minute is enough for its owner, and spares a write on every call.
  if (key.lastUsedAt === null || now.getTime() - key.lastUsedAt.getTime() > lastUsedStepMs) {
    await db.update(apiKeys).set({ lastUsedAt: now }).where(eq(apiKeys.id, key.id));
  }
  return account;
}
