import { timestamp, uuid } from "drizzle-orm/pg-core";

export const id = () => uuid().primaryKey().defaultRandom();
export const at = () => timestamp({ withTimezone: true, mode: "date" });
export const createdAt = () => at().notNull().defaultNow();
