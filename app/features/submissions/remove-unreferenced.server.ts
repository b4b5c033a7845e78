import { inArray } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import { logger } from "@/app/platform/logger.server";
import { remove } from "@/app/platform/storage.server";
import { files } from "@/drizzle/schema";

/**
 * Removes stored bytes that no row refers to, after an upload or a submission was refused.
 * Asks the database first: a commit whose answer was lost keeps its files. Throws nothing, so that
 * the refusal that led here is the one its caller reports.
 */
export async function removeUnreferenced(storageKeys: string[]): Promise<void> {
  if (storageKeys.length === 0) return;
  try {
    const referenced = await db
      .select({ storageKey: files.storageKey })
      .from(files)
      .where(inArray(files.storageKey, storageKeys));
    const kept = new Set(referenced.map((row) => row.storageKey));
    await Promise.all(storageKeys.filter((key) => !kept.has(key)).map((key) => remove(key)));
  } catch (error) {
    logger.error("stored files could not be removed", { storageKeys, reason: String(error) });
  }
}
