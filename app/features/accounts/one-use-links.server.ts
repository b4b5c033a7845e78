import { and, eq, gt, isNull, lt } from "drizzle-orm";
import type { LinkKind } from "@/drizzle/enums";
import { tokens } from "@/drizzle/schema";
import { type Transaction, db } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import { hashSecret, newSecret } from "@/app/platform/secrets.server";

export const linkLifetimeSeconds = 3600;

/** The secret of a link that works once, for an hour. Only its hash is kept. */
export async function issueLink(tx: Transaction, userId: string, kind: LinkKind): Promise<string> {
  const secret = newSecret();
  await tx.delete(tokens).where(and(eq(tokens.userId, userId), lt(tokens.expiresAt, new Date())));
  await tx.insert(tokens).values({
    userId,
    kind,
    secretHash: hashSecret(secret),
    expiresAt: new Date(Date.now() + linkLifetimeSeconds * 1000),
  });
  return secret;
}

/** Marks the link as used and answers whose it is. Of two requests with one link, one is refused. */
export async function redeemLink(tx: Transaction, secret: string, kind: LinkKind): Promise<string> {
  const [row] = await tx
    .update(tokens)
    .set({ usedAt: new Date() })
    .where(isUsable(secret, kind))
    .returning({ userId: tokens.userId });
  if (!row) throw invalid("This link has been used or is older than an hour. Ask for a new one.");
  return row.userId;
}

/** Whether a page may offer the link's form; the use itself is decided by `redeemLink`. */
export async function isLinkUsable(secret: string, kind: LinkKind): Promise<boolean> {
  const rows = await db.select({ id: tokens.id }).from(tokens).where(isUsable(secret, kind));
  return rows.length > 0;
}

/** Ends the links of this kind that are still in somebody's mailbox. */
export async function endLinks(tx: Transaction, userId: string, kind: LinkKind): Promise<void> {
  await tx
    .update(tokens)
    .set({ usedAt: new Date() })
    .where(and(eq(tokens.userId, userId), eq(tokens.kind, kind), isNull(tokens.usedAt)));
}

function isUsable(secret: string, kind: LinkKind) {
  return and(
    eq(tokens.secretHash, hashSecret(secret)),
    eq(tokens.kind, kind),
    isNull(tokens.usedAt),
    gt(tokens.expiresAt, new Date()),
  );
}
