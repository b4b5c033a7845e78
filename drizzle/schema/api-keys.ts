import { sql } from "drizzle-orm";
import { check, index, jsonb, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import type { ApiScope } from "../enums";
import { at, createdAt, id } from "./columns";
import { users } from "./users";

/** Personal access tokens of the API: shown once, kept as a hash. */
export const apiKeys = pgTable(
  "api_keys",
  {
    id: id(),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    name: text().notNull(),
    secretHash: text().notNull().unique(),
    /** The first characters of the secret, so that its owner recognises it. */
    prefix: text().notNull(),
    scopes: text().array().$type<ApiScope[]>().notNull(),
    createdAt: createdAt(),
    expiresAt: at(),
    lastUsedAt: at(),
    revokedAt: at(),
  },
  (t) => [
    index().on(t.userId),
    check("api_keys_scopes", sql`${t.scopes} <@ array['read','submit','curate','review']`),
  ],
);

/** One answer for each (token, Idempotency-Key), kept 24 hours. */
export const idempotencyKeys = pgTable(
  "idempotency_keys",
  {
    apiKeyId: uuid()
      .notNull()
      .references(() => apiKeys.id, { onDelete: "cascade" }),
    key: text().notNull(),
    bodyHash: text().notNull(),
    answer: jsonb().$type<{ status: number; body: unknown }>(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.apiKeyId, t.key] })],
);
