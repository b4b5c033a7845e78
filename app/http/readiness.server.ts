import { db } from "@/app/platform/db.server";
import { logger } from "@/app/platform/logger.server";
import { isQueueReachable } from "@/app/platform/queue.server";
import { isStorageReachable } from "@/app/platform/storage.server";

export interface Readiness {
  database: boolean;
  storage: boolean;
  queue: boolean;
}

const patienceMs = 3000;

/** Which of the services that this process needs can be reached now. */
export async function checkReadiness(): Promise<Readiness> {
  const [database, storage, queue] = await Promise.all([
    isReached("database", async () => {
      await db.execute("select 1");
      return true;
    }),
    isReached("storage", async () => isStorageReachable()),
    isReached("queue", async () => isQueueReachable()),
  ]);
  return { database, storage, queue };
}

/** A service that does not answer is not reached; waiting for it longer would hang the prober too. */
async function isReached(service: string, ask: () => Promise<boolean>): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), patienceMs);
  });
  try {
    return await Promise.race([ask(), tooLate]);
  } catch (error) {
    logger.warn("service not reachable", { service, reason: String(error) });
    return false;
  } finally {
    clearTimeout(timer);
  }
}
