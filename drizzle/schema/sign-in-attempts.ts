import { bigserial, index, pgTable, text } from "drizzle-orm/pg-core";
import { createdAt } from "./columns";

/** Failed sign-ins by account and by address, hashed: what the throttle counts. */
export const signInAttempts = pgTable(
  "sign_in_attempts",
  { id: bigserial({ mode: "number" }).primaryKey(), subjectHash: text().notNull(), createdAt: createdAt() },
  (t) => [index().on(t.subjectHash, t.createdAt)],
);
