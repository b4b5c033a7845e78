import { sql } from "drizzle-orm";
import { check, index, pgEnum, pgTable, text, uuid } from "drizzle-orm/pg-core";
import { decisionKinds } from "../enums";
import { createdAt, id } from "./columns";
import { submissions } from "./submissions";
import { users } from "./users";

export const decisionKindEnum = pgEnum("decision_kind", decisionKinds);

export const decisions = pgTable(
  "decisions",
  {
    id: id(),
    submissionId: uuid()
      .notNull()
      .references(() => submissions.id, { onDelete: "cascade" }),
    kind: decisionKindEnum().notNull(),
    note: text().notNull(),
    decidedById: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
  },
  (t) => [index().on(t.submissionId), check("decisions_note", sql`length(trim(${t.note})) > 0`)],
);
