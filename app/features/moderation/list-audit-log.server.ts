import { and, asc, desc, eq, lt } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { invalid } from "@/app/platform/errors";
import { auditEvents } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { requireRole, requireScope } from "../accounts/viewer-policy";
import type { AuditLogItem } from "./moderation-view";

export interface AuditLogFilter {
  action?: string | null;
  actor?: string | null;
  subject?: string | null;
  cursor?: string | null;
  limit?: number;
}

/** The audit log, newest first; it holds account ids, never names. */
export async function listAuditLog(
  viewer: Viewer,
  { action = null, actor = null, subject = null, cursor = null, limit = 100 }: AuditLogFilter = {},
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
    .where(
      and(
        cursor === null ? undefined : lt(auditEvents.id, Number(cursor)),
        action === null ? undefined : eq(auditEvents.action, action),
        actor === null ? undefined : eq(auditEvents.actorId, actor),
        subject === null ? undefined : eq(auditEvents.subjectId, subject),
      ),
    )
    .orderBy(desc(auditEvents.id))
    .limit(size + 1);
  const items = rows.slice(0, size);
  return { items, nextCursor: rows.length > size ? String(items[items.length - 1].id) : null };
}

/** The kinds of event that have occurred, to filter by. */
export async function listAuditActions(viewer: Viewer): Promise<string[]> {
  requireRole(viewer, "admin");
  requireScope(viewer, "review");
  const rows = await db
    .selectDistinct({ action: auditEvents.action })
    .from(auditEvents)
    .orderBy(asc(auditEvents.action));
  return rows.map((row) => row.action);
}
