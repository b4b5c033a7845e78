import { eq, sql } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import {
  endOtherSessions,
  endSession,
  listMySessions,
  sessionLifetimeSeconds,
  startSession,
  viewerOfSession,
} from "@/app/features/accounts/sessions.server";
import { checkCredentials, signInLimits } from "@/app/features/accounts/sign-in.server";
import { db } from "@/app/platform/db.server";
import { AppError } from "@/app/platform/errors";
import { sessions, signInAttempts, users } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";

useDatabase();

const password = "seven grey herons";
let serial = 0;
let email = "";
let userId = "";

beforeEach(async () => {
  serial += 1;
  email = `reader${serial}@example.org`;
  userId = (await ensureAccount({ name: "Ines Roth", email, password, role: "author" })).userId;
  await db.delete(signInAttempts);
});

const tryWrong = (account: string, address: string | null) =>
  checkCredentials({ email: account, password: "not the password", address }).then(
    () => "signed in",
    (error: unknown) => (error instanceof AppError ? error.kind : "outage"),
  );

describe("signing in", () => {
  it("takes the right password", async () => {
    expect(await checkCredentials({ email, password, address: "192.0.2.1" })).toEqual({ userId });
  });

  it("answers a wrong password, an unknown address and a suspended account alike", async () => {
    const answers: unknown[] = [];
    const keep = (error: unknown) =>
      answers.push(error instanceof AppError ? [error.kind, error.message] : error);
    await checkCredentials({ email, password: "wrong password", address: null }).catch(keep);
    await checkCredentials({ email: "nobody@example.org", password, address: null }).catch(keep);
    await db.update(users).set({ suspendedAt: new Date() }).where(eq(users.id, userId));
    await checkCredentials({ email, password, address: null }).catch(keep);
    expect(answers).toHaveLength(3);
    expect(answers[1]).toEqual(answers[0]);
    expect(answers[2]).toEqual(answers[0]);
  });

  it.each(["known", "unknown"])(
    "is refused for a while after too many failures of an account that is %s",
    async (which) => {
      const account = which === "known" ? email : "nobody@example.org";
      for (let i = 0; i < signInLimits.byAccount; i += 1)
        expect(await tryWrong(account, null)).toBe("invalid");
      const refusal: unknown = await checkCredentials({ email: account, password, address: null }).catch(
        (error: unknown) => error,
      );
      expect(refusal).toMatchObject({ kind: "limitReached" });
      const seconds = (refusal as AppError).details.retryAfterSeconds ?? 0;
      expect(seconds).toBeGreaterThan(0);
      expect(seconds).toBeLessThanOrEqual(signInLimits.windowSeconds);
    },
  );

  it("counts tries that are made at the same moment", async () => {
    const tries = await Promise.all(
      Array.from({ length: signInLimits.byAccount + 5 }, () => tryWrong(email, null)),
    );
    expect(tries.filter((one) => one === "limitReached")).toHaveLength(5);
  });

  it("is refused to a network address that tries many accounts", async () => {
    const many = Array.from({ length: signInLimits.byAddress }, (_, i) => `nobody${i}@example.org`);
    await Promise.all(many.map((account) => tryWrong(account, "192.0.2.7")));
    expect(await tryWrong(email, "192.0.2.7")).toBe("limitReached");
    expect(await tryWrong(email, "192.0.2.8")).toBe("invalid");
  });

  it("is possible again once the window has passed", async () => {
    for (let i = 0; i < signInLimits.byAccount; i += 1) await tryWrong(email, null);
    await db
      .update(signInAttempts)
      .set({ createdAt: sql`now() - make_interval(secs => ${signInLimits.windowSeconds + 1})` });
    expect(await checkCredentials({ email, password, address: null })).toEqual({ userId });
  });

  it("forgets an account's failures once its owner signs in", async () => {
    for (let i = 0; i < signInLimits.byAccount - 1; i += 1) await tryWrong(email, "192.0.2.9");
    await checkCredentials({ email, password, address: "192.0.2.9" });
    expect(await tryWrong(email, "192.0.2.9")).toBe("invalid");
  });

  it("keeps neither an account nor a network address readable in what it counts", async () => {
    await tryWrong(email, "192.0.2.10");
    const rows = JSON.stringify(await db.select().from(signInAttempts));
    expect(rows).not.toContain(email);
    expect(rows).not.toContain("192.0.2.10");
  });
});

describe("a session", () => {
  it("is kept as a hash only and names its account", async () => {
    const secret = await startSession(userId, "Browser 1");
    const rows = await db.select().from(sessions).where(eq(sessions.userId, userId));
    expect(JSON.stringify(rows)).not.toContain(secret);
    expect(await viewerOfSession(secret)).toMatchObject({ userId, email, role: "author", scopes: null });
  });

  it("ends with the sign-out", async () => {
    const secret = await startSession(userId, null);
    await endSession(secret);
    expect(await viewerOfSession(secret)).toBeNull();
  });

  it("ends 12 hours after the sign-in", async () => {
    const secret = await startSession(userId, null);
    const [row] = await db.select().from(sessions).where(eq(sessions.userId, userId));
    expect(sessionLifetimeSeconds).toBe(43_200);
    expect(Math.round((row.expiresAt.getTime() - row.createdAt.getTime()) / 60_000)).toBe(720);
    await db.update(sessions).set({ expiresAt: new Date(Date.now() - 1) });
    expect(await viewerOfSession(secret)).toBeNull();
  });

  it("ends for a suspended account", async () => {
    const secret = await startSession(userId, null);
    await db.update(users).set({ suspendedAt: new Date() }).where(eq(users.id, userId));
    expect(await viewerOfSession(secret)).toBeNull();
  });

  it("shows its owner the others and can end them all", async () => {
    const here = await startSession(userId, "Here");
    const there = await startSession(userId, "There");
    const viewer = await viewerOfSession(here);
    const listed = await listMySessions(viewer, here);
    expect(listed.map((one) => [one.userAgent, one.isCurrent]).sort()).toEqual([
      ["Here", true],
      ["There", false],
    ]);
    expect(await endOtherSessions(viewer, here)).toBe(1);
    expect(await viewerOfSession(there)).toBeNull();
    expect(await viewerOfSession(here)).not.toBeNull();
  });

  it("is nobody's for a secret that was never given out", async () => {
    expect(await viewerOfSession("")).toBeNull();
    expect(await viewerOfSession("x".repeat(43))).toBeNull();
  });
});
