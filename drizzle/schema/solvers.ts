import { sql } from "drizzle-orm";
import { check, pgEnum, pgTable, real, text, unique, uuid } from "drizzle-orm/pg-core";
import { claimKinds, methodFamilies } from "../enums";
import { createdAt, id } from "./columns";
import { teams } from "./teams";

export const methodFamilyEnum = pgEnum("method_family", methodFamilies);
export const claimKindEnum = pgEnum("claim_kind", claimKinds);

export const solvers = pgTable(
  "solvers",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id),
    slug: text().notNull(),
    name: text().notNull(),
    family: methodFamilyEnum().notNull(),
    /** The basis or stencil in a word or two: "central", "collocation", "tridiagonal". */
    method: text().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    unique().on(t.teamId, t.slug),
    check("solvers_slug", sql`${t.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`),
  ],
);

export const solverVersions = pgTable(
  "solver_versions",
  {
    id: id(),
    solverId: uuid()
      .notNull()
      .references(() => solvers.id),
    version: text().notNull(),
    claimKind: claimKindEnum().notNull(),
    /** The formal order of accuracy; null where exponential convergence or nothing is claimed. */
    formalOrder: real(),
    /** The method in one or two sentences, as the author gives it. */
    description: text().notNull().default(""),
    createdAt: createdAt(),
  },
  (t) => [
    unique().on(t.solverId, t.version),
    check(
      "solver_versions_order_goes_with_algebraic",
      sql`(${t.claimKind} = 'algebraic') = (${t.formalOrder} is not null)`,
    ),
    check("solver_versions_order_range", sql`${t.formalOrder} > 0 and ${t.formalOrder} <= 64`),
  ],
);
