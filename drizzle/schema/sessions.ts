import { index, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { at, createdAt } from "./columns";
import { users } from "./users";

/** The cookie carries the session's secret; only its SHA-256 is kept here. */
export const sessions = pgTable(
  "sessions",
  {
    idHash: text().primaryKey(),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    userAgent: text(),
    createdAt: createdAt(),
    lastSeenAt: createdAt(),
    expiresAt: at().notNull(),
  },
  (t) => [index().on(t.userId), index().on(t.expiresAt)],
);
