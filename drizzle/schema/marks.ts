import { sql } from "drizzle-orm";
import { bigint, boolean, doublePrecision, index, pgTable, primaryKey, smallint, uuid } from "drizzle-orm/pg-core";
import { problemRevisions } from "./problems";
import { measureEnum, relativeNormEnum } from "./scores";
import { methodFamilyEnum } from "./solvers";
import { submissions } from "./submissions";

/** Nodes that a submission needs for the tolerances 10^(-k/2), k = 0..28: what rankings across problems read. */
export const marks = pgTable(
  "marks",
  {
    submissionId: uuid()
      .notNull()
      .references(() => submissions.id, { onDelete: "cascade" }),
    problemRevisionId: uuid()
      .notNull()
      .references(() => problemRevisions.id),
    norm: relativeNormEnum().notNull(),
    measure: measureEnum().notNull(),
    /** k of the tolerance 10^(-k/2). */
    toleranceStep: smallint().notNull(),
    nodes: bigint({ mode: "number" }).notNull(),
    isAtMost: boolean().notNull(),
    cost: doublePrecision(),
    family: methodFamilyEnum().notNull(),
    isListed: boolean().notNull().default(false),
  },
  (t) => [
    primaryKey({ columns: [t.submissionId, t.problemRevisionId, t.norm, t.measure, t.toleranceStep] }),
    index("marks_ranking")
      .on(t.problemRevisionId, t.norm, t.measure, t.toleranceStep, t.nodes, t.submissionId)
      .where(sql`${t.isListed}`),
    index("marks_ranking_by_family")
      .on(t.problemRevisionId, t.norm, t.measure, t.toleranceStep, t.family, t.nodes, t.submissionId)
      .where(sql`${t.isListed}`),
  ],
);
