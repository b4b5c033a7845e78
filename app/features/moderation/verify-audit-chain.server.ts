import { asc, gt } from "drizzle-orm";
import { auditEvents } from "@/drizzle/schema";
import { db } from "@/app/platform/db.server";
import { auditChainStart, auditEventHash } from "./record-audit-event.server";

export type AuditChainCheck = { isWhole: true; events: number } | { isWhole: false; brokenAtId: number };

const pageSize = 1000;

/** Recomputes every hash from the first event on; names the first row that does not fit. */
export async function verifyAuditChain(): Promise<AuditChainCheck> {
  let previousHash = auditChainStart;
  let events = 0;
  let lastId = 0;
  for (;;) {
    const rows = await db
      .select()
      .from(auditEvents)
      .where(gt(auditEvents.id, lastId))
      .orderBy(asc(auditEvents.id))
      .limit(pageSize);
    for (const row of rows) {
      const fits = row.previousHash === previousHash && row.hash === auditEventHash(row, previousHash);
      if (!fits) return { isWhole: false, brokenAtId: row.id };
      previousHash = row.hash;
      lastId = row.id;
    }
    events += rows.length;
    if (rows.length < pageSize) return { isWhole: true, events };
  }
}
