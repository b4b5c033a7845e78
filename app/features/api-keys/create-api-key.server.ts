import { and, count, eq, isNull } from "drizzle-orm";
import { apiKeys } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { conflict, invalid } from "@/app/platform/errors";
import { hashSecret, newSecret } from "@/app/platform/secrets.server";
import type { Viewer } from "../accounts/viewer";
import { requireAccount } from "../accounts/viewer-policy";
import { recordAuditEvent } from "../moderation/record-audit-event.server";
import type { ApiKeyInput } from "./api-key-form";
import { grantableScopes } from "./api-key-policy";

/** Makes a secret recognisable to its owner and to scanners that look for leaked ones. */
export const secretPrefix = "bks_";

const mostKeys = 50;
const shownCharacters = secretPrefix.length + 4;
const dayMs = 86_400_000;

/** The only answer that ever holds the secret: the database keeps its hash. */
export async function createApiKey(
  viewer: Viewer,
  input: ApiKeyInput,
): Promise<{ id: string; secret: string }> {
  const account = requireAccount(viewer);
  const grantable = grantableScopes(account);
  const refused = input.scopes.filter((scope) => !grantable.includes(scope));
  if (refused.length > 0) {
    const scopes = `You may not give the scope ${refused.join(", ")}. You may give ${grantable.join(", ")}.`;
    throw invalid(scopes, { scopes });
  }
  const secret = secretPrefix + newSecret();
  return db.transaction(async (tx) => {
    const [held] = await tx
      .select({ keys: count() })
      .from(apiKeys)
      .where(and(eq(apiKeys.userId, account.userId), isNull(apiKeys.revokedAt)));
    if (held.keys >= mostKeys) throw conflict(`You hold ${mostKeys} tokens. Revoke one first.`);
    const [row] = await tx
      .insert(apiKeys)
      .values({
        userId: account.userId,
        name: input.name,
        secretHash: hashSecret(secret),
        prefix: secret.slice(0, shownCharacters),
        scopes: [...new Set(input.scopes)],
        expiresAt: input.expiresInDays === null ? null : new Date(Date.now() + input.expiresInDays * dayMs),
      })
      .returning({ id: apiKeys.id });
    await recordAuditEvent(tx, {
      actorId: account.userId,
      action: "apiKey.created",
      subjectKind: "apiKey",
      subjectId: row.id,
      detail: { scopes: input.scopes, expiresInDays: input.expiresInDays },
    });
    return { id: row.id, secret };
  });
}
