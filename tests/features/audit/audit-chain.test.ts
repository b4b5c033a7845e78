import { asc, eq, sql } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { auditChainStart, recordAuditEvent } from "@/app/features/moderation/record-audit-event.server";
import { verifyAuditChain } from "@/app/features/moderation/verify-audit-chain.server";
import { db } from "@/app/platform/db.server";
import { auditEvents } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";

useDatabase();

const record = (action: string, detail: Record<string, unknown> = {}) =>
  db.transaction((tx) =>
    recordAuditEvent(tx, { actorId: null, action, subjectKind: "test", subjectId: "1", detail }),
  );

const storedEvents = () => db.select().from(auditEvents).orderBy(asc(auditEvents.id));

describe("the audit log", () => {
  it("chains each event to the one before, also when many are written at once", async () => {
    await Promise.all(
      Array.from({ length: 12 }, (_, i) => record(`test.${i}`, { b: i, a: { d: 1, c: [null, "x"] } })),
    );
    const events = await storedEvents();
    expect(events).toHaveLength(12);
    expect(events[0].previousHash).toBe(auditChainStart);
    for (let i = 1; i < events.length; i += 1) expect(events[i].previousHash).toBe(events[i - 1].hash);
    expect(await verifyAuditChain()).toEqual({ isWhole: true, events: 12 });
  });

  it("keeps no event of a transaction that was rolled back", async () => {
    const before = await storedEvents();
    const outage = new Error("rolled back");
    await expect(
      db.transaction(async (tx) => {
        await recordAuditEvent(tx, {
          actorId: null,
          action: "test.lost",
          subjectKind: "test",
          subjectId: "1",
          detail: {},
        });
        throw outage;
      }),
    ).rejects.toBe(outage);
    await record("test.kept");
    expect(await storedEvents()).toHaveLength(before.length + 1);
    expect(await verifyAuditChain()).toMatchObject({ isWhole: true });
  });

  it("refuses changes and deletions in the database itself", async () => {
    const [first] = await storedEvents();
    const change = db.update(auditEvents).set({ action: "test.changed" }).where(eq(auditEvents.id, first.id));
    await expect(change.execute()).rejects.toThrow();
    await expect(db.delete(auditEvents).where(eq(auditEvents.id, first.id)).execute()).rejects.toThrow();
  });

  it("shows by recomputation which event was altered behind its back", async () => {
    const events = await storedEvents();
    const altered = events[5];
    await pastTheGuard(sql`update audit_events set detail = '{"b": 99}' where id = ${altered.id}`);
    expect(await verifyAuditChain()).toEqual({ isWhole: false, brokenAtId: altered.id });
    await pastTheGuard(
      sql`update audit_events set detail = ${JSON.stringify(altered.detail)}::jsonb where id = ${altered.id}`,
    );
    expect(await verifyAuditChain()).toMatchObject({ isWhole: true });
  });

  it("shows by recomputation that an event was taken out", async () => {
    const events = await storedEvents();
    await pastTheGuard(sql`delete from audit_events where id = ${events[3].id}`);
    expect(await verifyAuditChain()).toEqual({ isWhole: false, brokenAtId: events[4].id });
  });
});

/** What somebody with the database's own rights could do: the chain is there to show it. */
async function pastTheGuard(change: ReturnType<typeof sql>): Promise<void> {
  await db.transaction(async (tx) => {
    await tx.execute(sql`alter table audit_events disable trigger user`);
    await tx.execute(change);
    await tx.execute(sql`alter table audit_events enable trigger user`);
  });
}
