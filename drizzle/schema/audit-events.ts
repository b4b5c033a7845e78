import { bigserial, index, jsonb, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { at } from "./columns";

/**
 * Append-only: a trigger of the migrations refuses update and delete.
 * Holds account ids, never names or addresses; each row carries the hash of the one before.
 */
export const auditEvents = pgTable(
  "audit_events",
  {
    id: bigserial({ mode: "number" }).primaryKey(),
    at: at().notNull(),
    actorId: uuid(),
    action: text().notNull(),
    subjectKind: text().notNull(),
    subjectId: text().notNull(),
    detail: jsonb().$type<Record<string, unknown>>().notNull(),
    previousHash: text().notNull(),
    hash: text().notNull().unique(),
  },
  (t) => [index().on(t.subjectKind, t.subjectId), index().on(t.action)],
);
