import { AppError } from "@/app/platform/errors";

export interface Slots {
  /** Runs the task when one of the slots is free; a caller whose signal aborts meanwhile leaves the queue. */
  use<R>(signal: AbortSignal, task: () => Promise<R>): Promise<R>;
}

/** A bound on how many tasks of a kind run at the same time in this process; the others wait in order. */
export function createSlots(count: number): Slots {
  let free = count;
  const waiting: (() => void)[] = [];

  async function take(signal: AbortSignal): Promise<void> {
    if (free > 0) {
      free -= 1;
      return;
    }
    await new Promise<void>((resolve, reject) => {
      const start = () => {
        signal.removeEventListener("abort", leave);
        resolve();
      };
      const leave = () => {
        waiting.splice(waiting.indexOf(start), 1);
        reject(new AppError("invalid", "The request was given up while it waited for its turn."));
      };
      signal.addEventListener("abort", leave, { once: true });
      waiting.push(start);
    });
  }

  function release(): void {
    const next = waiting.shift();
    if (next) next();
    else free += 1;
  }

  return {
    async use(signal, task) {
      await take(signal);
      try {
        return await task();
      } finally {
        release();
      }
    },
  };
}
