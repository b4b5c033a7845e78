import { describe, expect, it } from "vitest";
import { createSlots } from "@/app/http/slots.server";

const never = new AbortController().signal;

/** A task that ends when it is told to. */
function heldTask() {
  let finish: (value: string) => void = () => undefined;
  const ended = new Promise<string>((resolve) => (finish = resolve));
  return { task: () => ended, finish };
}

describe("a bound on tasks", () => {
  it("runs no more at once than it has slots, and the waiting ones in order", async () => {
    const slots = createSlots(1);
    const first = heldTask();
    const started: string[] = [];
    const running = slots.use(never, first.task);
    const waiting = ["second", "third"].map((name) => slots.use(never, async () => void started.push(name)));
    await Promise.resolve();
    expect(started).toEqual([]);
    first.finish("done");
    expect(await running).toBe("done");
    await Promise.all(waiting);
    expect(started).toEqual(["second", "third"]);
  });

  it("frees the slot of a task that fails", async () => {
    const slots = createSlots(1);
    await expect(slots.use(never, () => Promise.reject(new Error("broken")))).rejects.toThrow("broken");
    expect(await slots.use(never, async () => "next")).toBe("next");
  });

  it("lets a caller who gives up leave the queue without taking a slot", async () => {
    const slots = createSlots(1);
    const first = heldTask();
    const running = slots.use(never, first.task);
    const leaving = new AbortController();
    const given = slots.use(leaving.signal, async () => "never run");
    leaving.abort();
    await expect(given).rejects.toMatchObject({ kind: "invalid" });
    first.finish("done");
    await running;
    expect(await slots.use(never, async () => "free")).toBe("free");
  });
});
