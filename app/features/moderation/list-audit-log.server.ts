import { desc, lt } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import { auditEvents } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireRole, requireScope } from "../accounts/viewer-policy";
import type { AuditLogItem } from "./moderation-view";

/** The audit log, newest first; it holds account ids, never names. */
export async function listAuditLog(
  viewer: Viewer,
  { cursor = null, limit = 100 }: { cursor?: string | null; limit?: number } = {},
): Promise<{ items: AuditLogItem[]; nextCursor: string | null }> {
  requireRole(viewer, "admin");
  requireScope(viewer, "review");
  if (cursor !== null && !/^\d{1,15}$/.test(cursor)) {
    throw invalid("The cursor is not one of this list.", { cursor: "Use nextCursor of the page before." });
  }
  const size = Math.min(Math.max(limit, 1), 200);
  const rows = await db
    .select()
    .from(auditEvents)
    .where(cursor === null ? undefined : lt(auditEvents.id, Number(cursor)))
    .orderBy(desc(auditEvents.id))
    .limit(size + 1);
  const items = rows.slice(0, size);
  return { items, nextCursor: rows.length > size ? String(items[items.length - 1].id) : null };
}
