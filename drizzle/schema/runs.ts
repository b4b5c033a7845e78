import { sql } from "drizzle-orm";
import { bigint, check, doublePrecision, index, integer, jsonb, pgEnum, pgTable, unique, uuid } from "drizzle-orm/pg-core";
import type { Refusal } from "../../benchmarks/scoring/data-error";
import { runRoles, runStates } from "../enums";
import { id } from "./columns";
import { files } from "./files";
import { submissions } from "./submissions";

export const runRoleEnum = pgEnum("run_role", runRoles);
export const runStateEnum = pgEnum("run_state", runStates);

export const runs = pgTable(
  "runs",
  {
    id: id(),
    submissionId: uuid()
      .notNull()
      .references(() => submissions.id, { onDelete: "cascade" }),
    fileId: uuid()
      .notNull()
      .references(() => files.id),
    ordinal: integer().notNull(),
    /** Nodes along each axis. */
    n: integer().array().notNull(),
    role: runRoleEnum().notNull().default("study"),
    unknowns: bigint({ mode: "number" }),
    dt: doublePrecision(),
    steps: bigint({ mode: "number" }),
    wallSeconds: doublePrecision(),
    yardstickSeconds: doublePrecision(),
    state: runStateEnum().notNull().default("waiting"),
    refusal: jsonb().$type<Refusal>(),
  },
  (t) => [
    unique().on(t.submissionId, t.ordinal),
    index().on(t.fileId),
    check("runs_n", sql`array_length(${t.n}, 1) between 1 and 2`),
    check("runs_refused_has_reason", sql`(${t.state} = 'refused') = (${t.refusal} is not null)`),
    check("runs_declared_costs", sql`${t.wallSeconds} >= 0 and ${t.yardstickSeconds} > 0 and ${t.dt} > 0`),
  ],
);
