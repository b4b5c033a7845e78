import { sql } from "drizzle-orm";
import { boolean, check, index, pgEnum, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import { membershipRoles } from "../enums";
import { createdAt, id } from "./columns";
import { users } from "./users";

export const membershipRoleEnum = pgEnum("membership_role", membershipRoles);

export const teams = pgTable(
  "teams",
  {
    id: id(),
    slug: text().notNull().unique(),
    name: text().notNull(),
    /** The team that runs the reference solvers: its records are marked as the house's own. */
    isHouse: boolean().notNull().default(false),
    createdAt: createdAt(),
  },
  (t) => [check("teams_slug", sql`${t.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`)],
);

export const memberships = pgTable(
  "memberships",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    role: membershipRoleEnum().notNull(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.userId] }), index().on(t.userId)],
);
