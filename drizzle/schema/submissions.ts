import { sql } from "drizzle-orm";
import { check, index, integer, jsonb, pgEnum, pgSequence, pgTable, text, unique, uniqueIndex, uuid } from "drizzle-orm/pg-core";
import type { Declaration } from "../../benchmarks/scoring/declaration";
import type { Refusal } from "../../benchmarks/scoring/data-error";
import { submissionStates } from "../enums";
import { at, createdAt, id } from "./columns";
import { problemRevisions } from "./problems";
import { solverVersions } from "./solvers";
import { teams } from "./teams";
import { users } from "./users";

export const submissionStateEnum = pgEnum("submission_state", submissionStates);

export const submissionNumbers = pgSequence("submission_numbers", { startWith: 1001 });
export const recordNumbers = pgSequence("record_numbers", { startWith: 1 });

export const submissions = pgTable(
  "submissions",
  {
    id: id(),
    /** Shown as S-1001. */
    number: integer()
      .notNull()
      .unique()
      .default(sql`nextval('submission_numbers')`),
    problemRevisionId: uuid()
      .notNull()
      .references(() => problemRevisions.id),
    solverVersionId: uuid()
      .notNull()
      .references(() => solverVersions.id),
    teamId: uuid()
      .notNull()
      .references(() => teams.id),
    /** Null once the account is deleted: the record stays under the team's name. */
    submittedById: uuid().references(() => users.id, { onDelete: "set null" }),
    state: submissionStateEnum().notNull(),
    declaration: jsonb().$type<Declaration>().notNull(),
    /** What decides whether a listed submission supersedes another of the same solver and problem. */
    variant: text().notNull(),
    dataLicence: text().notNull(),
    /** Why the files could not be scored, where the state is failed. */
    refusals: jsonb().$type<Refusal[]>(),
    recordNumber: integer(),
    recordVersion: integer(),
    createdAt: createdAt(),
    scoredAt: at(),
    handedInAt: at(),
    listedAt: at(),
  },
  (t) => [
    unique().on(t.recordNumber, t.recordVersion),
    uniqueIndex("submissions_one_listed_version")
      .on(t.recordNumber)
      .where(sql`${t.state} = 'listed'`),
    index().on(t.problemRevisionId).where(sql`${t.state} = 'listed'`),
    index().on(t.state, t.handedInAt),
    index().on(t.teamId),
    index().on(t.solverVersionId),
    check(
      "submissions_record_has_number",
      sql`(${t.state} in ('listed', 'superseded', 'withdrawn')) = (${t.recordNumber} is not null and ${t.recordVersion} is not null and ${t.listedAt} is not null)`,
    ),
    check("submissions_failed_has_reason", sql`${t.state} <> 'failed' or ${t.refusals} is not null`),
  ],
);
