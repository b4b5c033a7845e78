import { sql } from "drizzle-orm";
import { bigint, check, index, pgTable, text } from "drizzle-orm/pg-core";
import { createdAt, id } from "./columns";

/** Stored bytes. A row never changes: a replaced file is a new row. */
export const files = pgTable(
  "files",
  {
    id: id(),
    name: text().notNull(),
    sha256: text().notNull(),
    sizeBytes: bigint({ mode: "number" }).notNull(),
    storageKey: text().notNull().unique(),
    createdAt: createdAt(),
  },
  (t) => [
    index().on(t.sha256),
    check("files_sha256", sql`${t.sha256} ~ '^[0-9a-f]{64}$'`),
    check("files_size", sql`${t.sizeBytes} >= 0`),
  ],
);
