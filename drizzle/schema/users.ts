import { sql } from "drizzle-orm";
import { check, pgEnum, pgTable, text } from "drizzle-orm/pg-core";
import { roles } from "../enums";
import { at, createdAt, id } from "./columns";

export const roleEnum = pgEnum("role", roles);

export const users = pgTable(
  "users",
  {
    id: id(),
    email: text().notNull().unique(),
    name: text().notNull(),
    passwordHash: text().notNull(),
    role: roleEnum().notNull().default("author"),
    emailVerifiedAt: at(),
    suspendedAt: at(),
    createdAt: createdAt(),
  },
  (t) => [
    check("users_email_is_lower_case", sql`${t.email} = lower(${t.email}) and ${t.email} like '%_@_%'`),
    check("users_name_not_blank", sql`length(trim(${t.name})) > 0`),
  ],
);
