import { setTimeout as pause } from "node:timers/promises";

/** Waits until something has come about; says what it waited for where it does not. */
export async function until(
  what: string,
  hasComeAbout: () => Promise<boolean>,
  { patienceSeconds = 120, everyMs = 50 } = {},
): Promise<void> {
  const deadline = Date.now() + 1000 * patienceSeconds;
  while (!(await hasComeAbout())) {
    if (Date.now() > deadline) throw new Error(`Waited ${patienceSeconds} s in vain until ${what}.`);
    await pause(everyMs);
  }
}
