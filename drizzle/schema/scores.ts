import { index, jsonb, pgEnum, pgTable, text, unique, uuid } from "drizzle-orm/pg-core";
import type { RunScore, Study } from "../../benchmarks/scoring/result";
import { findingSeverities, measures, relativeNorms } from "../enums";
import { createdAt, id } from "./columns";
import { problemRevisions } from "./problems";
import { runs } from "./runs";
import { submissions } from "./submissions";

export const relativeNormEnum = pgEnum("relative_norm", relativeNorms);
export const measureEnum = pgEnum("measure", measures);
export const findingSeverityEnum = pgEnum("finding_severity", findingSeverities);

/** Scores are kept for each scorer version and never overwritten. */
export const runScores = pgTable(
  "run_scores",
  {
    id: id(),
    runId: uuid()
      .notNull()
      .references(() => runs.id, { onDelete: "cascade" }),
    problemRevisionId: uuid()
      .notNull()
      .references(() => problemRevisions.id),
    scorerVersion: text().notNull(),
    score: jsonb().$type<RunScore>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [unique().on(t.runId, t.problemRevisionId, t.scorerVersion)],
);

export const studies = pgTable(
  "studies",
  {
    id: id(),
    submissionId: uuid()
      .notNull()
      .references(() => submissions.id, { onDelete: "cascade" }),
    problemRevisionId: uuid()
      .notNull()
      .references(() => problemRevisions.id),
    scorerVersion: text().notNull(),
    norm: relativeNormEnum().notNull(),
    measure: measureEnum().notNull(),
    study: jsonb().$type<Study>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [unique().on(t.submissionId, t.problemRevisionId, t.scorerVersion, t.norm, t.measure)],
);

export const findings = pgTable(
  "findings",
  {
    id: id(),
    submissionId: uuid()
      .notNull()
      .references(() => submissions.id, { onDelete: "cascade" }),
    problemRevisionId: uuid()
      .notNull()
      .references(() => problemRevisions.id),
    scorerVersion: text().notNull(),
    code: text().notNull(),
    severity: findingSeverityEnum().notNull(),
    message: text().notNull(),
    /** The run that the finding is about: its nodes along each axis; null where it is about the study. */
    run: jsonb().$type<number[] | null>(),
    figures: jsonb().$type<Record<string, number | string | null>>().notNull(),
  },
  (t) => [index().on(t.submissionId), index().on(t.code)],
);
