import { sql } from "drizzle-orm";
import { check, integer, jsonb, pgEnum, pgTable, text, unique, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import type { ConsistencyProof } from "../../benchmarks/problems/consistency-proof";
import type { ProblemDefinition } from "../../benchmarks/problems/definition";
import { revisionStates } from "../enums";
import { at, createdAt, id } from "./columns";

export const revisionStateEnum = pgEnum("revision_state", revisionStates);

export const problems = pgTable(
  "problems",
  {
    id: id(),
    slug: text().notNull().unique(),
    /** P-01 for a periodic problem, B-01 for a bounded one. */
    code: text().notNull().unique(),
    createdAt: createdAt(),
  },
  (t) => [
    check("problems_slug", sql`${t.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`),
    check("problems_code", sql`${t.code} ~ '^[PBR]-[0-9]{2,}$'`),
  ],
);

/** A published revision is immutable; a trigger of the migrations holds that in the database. */
export const problemRevisions = pgTable(
  "problem_revisions",
  {
    id: id(),
    problemId: uuid()
      .notNull()
      .references(() => problems.id),
    number: integer().notNull(),
    state: revisionStateEnum().notNull(),
    definition: jsonb().$type<ProblemDefinition>().notNull(),
    proof: jsonb().$type<ConsistencyProof>(),
    whatChanged: text().notNull(),
    createdAt: createdAt(),
    publishedAt: at(),
  },
  (t) => [
    unique().on(t.problemId, t.number),
    uniqueIndex("problem_revisions_one_published")
      .on(t.problemId)
      .where(sql`${t.state} = 'published'`),
    check("problem_revisions_number", sql`${t.number} >= 1`),
    check(
      "problem_revisions_published_is_proven",
      sql`${t.state} = 'draft' or (${t.publishedAt} is not null and ${t.proof} is not null)`,
    ),
  ],
);
