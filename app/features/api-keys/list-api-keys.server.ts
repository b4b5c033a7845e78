import { and, desc, eq, isNull } from "drizzle-orm";
import type { ApiScope } from "@/drizzle/enums";
import { apiKeys } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import type { Viewer } from "../accounts/viewer";
import { requireAccount } from "../accounts/viewer-policy";

export interface ApiKeyItem {
  id: string;
  name: string;
  /** The first characters of the secret. */
  prefix: string;
  scopes: ApiScope[];
  createdAt: Date;
  expiresAt: Date | null;
  isExpired: boolean;
  lastUsedAt: Date | null;
}

/** The viewer's tokens that are not revoked, newest first. */
export async function listApiKeys(viewer: Viewer): Promise<ApiKeyItem[]> {
  const account = requireAccount(viewer);
  const rows = await db
    .select({
      id: apiKeys.id,
      name: apiKeys.name,
      prefix: apiKeys.prefix,
      scopes: apiKeys.scopes,
      createdAt: apiKeys.createdAt,
      expiresAt: apiKeys.expiresAt,
      lastUsedAt: apiKeys.lastUsedAt,
    })
    .from(apiKeys)
    .where(and(eq(apiKeys.userId, account.userId), isNull(apiKeys.revokedAt)))
    .orderBy(desc(apiKeys.createdAt));
  const now = new Date();
  return rows.map((row) => ({ ...row, isExpired: row.expiresAt !== null && row.expiresAt <= now }));
}
