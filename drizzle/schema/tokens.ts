import { index, pgEnum, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { linkKinds } from "../enums";
import { at, createdAt, id } from "./columns";
import { users } from "./users";

export const linkKindEnum = pgEnum("link_kind", linkKinds);

/** One-use links of e-mails: they work once, for an hour. */
export const tokens = pgTable(
  "tokens",
  {
    id: id(),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    kind: linkKindEnum().notNull(),
    secretHash: text().notNull().unique(),
    createdAt: createdAt(),
    expiresAt: at().notNull(),
    usedAt: at(),
  },
  (t) => [index().on(t.userId, t.kind)],
);
