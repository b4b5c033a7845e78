import { and, desc, eq, gt, lt, ne } from "drizzle-orm";
import { sessions } from "@/drizzle/schema";
import { type Transaction, db } from "@/app/platform/db.server";
import { hashSecret, newSecret } from "@/app/platform/secrets.server";
import { loadAccount } from "./load-account.server";
import type { Viewer } from "./viewer";
import { requireAccount } from "./viewer-policy";

/** From the sign-in, however much it is used: a stolen cookie ends too. */
export const sessionLifetimeSeconds = 12 * 3600;

const lastSeenStepSeconds = 60;

/** The secret goes into the cookie; the database keeps its hash. */
export async function startSession(userId: string, userAgent: string | null): Promise<string> {
  const secret = newSecret();
  await db.delete(sessions).where(and(eq(sessions.userId, userId), lt(sessions.expiresAt, new Date())));
  await db.insert(sessions).values({
    idHash: hashSecret(secret),
    userId,
    userAgent: userAgent?.slice(0, 300) ?? null,
    expiresAt: new Date(Date.now() + sessionLifetimeSeconds * 1000),
  });
  return secret;
}

export async function endSession(secret: string): Promise<void> {
  await db.delete(sessions).where(eq(sessions.idHash, hashSecret(secret)));
}

export async function endAllSessions(tx: Transaction, userId: string): Promise<void> {
  await tx.delete(sessions).where(eq(sessions.userId, userId));
}

/** Signs the viewer out everywhere but in the browser that asks. */
export async function endOtherSessions(viewer: Viewer, currentSecret: string): Promise<number> {
  const account = requireAccount(viewer);
  const ended = await db
    .delete(sessions)
    .where(and(eq(sessions.userId, account.userId), ne(sessions.idHash, hashSecret(currentSecret))))
    .returning({ idHash: sessions.idHash });
  return ended.length;
}

export interface SessionItem {
  isCurrent: boolean;
  userAgent: string | null;
  createdAt: Date;
  lastSeenAt: Date;
  expiresAt: Date;
}

export async function listMySessions(viewer: Viewer, currentSecret: string): Promise<SessionItem[]> {
  const account = requireAccount(viewer);
  const currentHash = hashSecret(currentSecret);
  const rows = await db
    .select()
    .from(sessions)
    .where(and(eq(sessions.userId, account.userId), gt(sessions.expiresAt, new Date())))
    .orderBy(desc(sessions.lastSeenAt));
  return rows.map((row) => ({
    isCurrent: row.idHash === currentHash,
    userAgent: row.userAgent,
    createdAt: row.createdAt,
    lastSeenAt: row.lastSeenAt,
    expiresAt: row.expiresAt,
  }));
}

export async function viewerOfSession(secret: string): Promise<Viewer> {
  const idHash = hashSecret(secret);
  const now = new Date();
  const [session] = await db
    .select({ userId: sessions.userId, lastSeenAt: sessions.lastSeenAt })
    .from(sessions)
    .where(and(eq(sessions.idHash, idHash), gt(sessions.expiresAt, now)));
  if (!session) return null;
  if (now.getTime() - session.lastSeenAt.getTime() > lastSeenStepSeconds * 1000) {
    await db.update(sessions).set({ lastSeenAt: now }).where(eq(sessions.idHash, idHash));
  }
  return loadAccount(session.userId, { scopes: null, apiKeyId: null });
}
