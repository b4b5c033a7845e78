import { createHash } from "node:crypto";
import { desc, sql } from "drizzle-orm";
import { auditEvents } from "@/drizzle/schema";
import type { Transaction } from "@/app/platform/db.server";

export interface AuditEvent {
  /** An account's id; null where the register itself acts. Never a name or an address. */
  actorId: string | null;
  /** `subject.verb`: "submission.listed", "apiKey.revoked". */
  action: string;
  subjectKind: string;
  subjectId: string;
  detail: Record<string, unknown>;
}

/** The hash before the first event. */
export const auditChainStart = "0".repeat(64);

/** Writes the event in the caller's transaction, chained to the one before. */
export async function recordAuditEvent(tx: Transaction, event: AuditEvent): Promise<void> {
  // Held to the end of the transaction: nobody else can chain to the same predecessor.
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended('audit_events', 0))`);
  const [last] = await tx
    .select({ hash: auditEvents.hash })
    .from(auditEvents)
    .orderBy(desc(auditEvents.id))
    .limit(1);
  const previousHash = last?.hash ?? auditChainStart;
  const at = new Date();
  await tx
    .insert(auditEvents)
    .values({ ...event, at, previousHash, hash: auditEventHash({ ...event, at }, previousHash) });
}

/** SHA-256 over the event and the hash before it, in an order of keys that does not depend on the storage. */
export function auditEventHash(event: AuditEvent & { at: Date }, previousHash: string): string {
  const { at, actorId, action, subjectKind, subjectId, detail } = event;
  const text = canonicalJson([
    previousHash,
    at.toISOString(),
    actorId,
    action,
    subjectKind,
    subjectId,
    detail,
  ]);
  return createHash("sha256").update(text).digest("hex");
}

function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    inner !== null && typeof inner === "object" && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}
