import { eq, sql } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { joinAccount } from "@/app/features/accounts/join-account.server";
import { isLinkUsable } from "@/app/features/accounts/one-use-links.server";
import { resendVerification } from "@/app/features/accounts/resend-verification.server";
import { requestReset, resetPassword } from "@/app/features/accounts/reset-password.server";
import { startSession, viewerOfSession } from "@/app/features/accounts/sessions.server";
import { checkCredentials } from "@/app/features/accounts/sign-in.server";
import { verifyEmail } from "@/app/features/accounts/verify-email.server";
import { requireVerified } from "@/app/features/accounts/viewer-policy";
import { db } from "@/app/platform/db.server";
import { signInAttempts, tokens, users } from "@/drizzle/schema";
import { useDatabase } from "../../support/database";
import { linkIn, sentMails } from "./sent-mails";

useDatabase();

const password = "seven grey herons";
let serial = 0;
let email = "";

beforeEach(async () => {
  serial += 1;
  email = `person${serial}@example.org`;
  await db.delete(signInAttempts);
});

async function join(): Promise<{ userId: string; secret: string }> {
  const { userId } = await joinAccount({ name: "Ines Roth", email, password });
  const [mail] = await sentMails(email);
  return { userId: userId ?? "", secret: linkIn(mail, "verify") };
}

describe("joining", () => {
  it("makes an author whose address is not verified, and mails a link", async () => {
    const { userId, secret } = await join();
    const [user] = await db.select().from(users).where(eq(users.id, userId));
    expect(user).toMatchObject({ email, role: "author", emailVerifiedAt: null });
    expect(await isLinkUsable(secret, "verifyEmail")).toBe(true);
  });

  it("keeps neither the password nor the link's secret readable in the tables of accounts", async () => {
    const { userId, secret } = await join();
    const [user] = await db.select().from(users).where(eq(users.id, userId));
    const [token] = await db.select().from(tokens).where(eq(tokens.userId, userId));
    expect(user.passwordHash).toMatch(/^\$argon2id\$/);
    expect(JSON.stringify([user, token])).not.toContain(password);
    expect(JSON.stringify([user, token])).not.toContain(secret);
  });

  it("changes nothing for an address that has an account, and tells its owner only", async () => {
    const { userId } = await join();
    const again = await joinAccount({ name: "Somebody", email, password: "another password" });
    expect(again.userId).toBeNull();
    const [user] = await db.select().from(users).where(eq(users.email, email));
    expect(user).toMatchObject({ id: userId, name: "Ines Roth" });
    const mails = await sentMails(email);
    expect(mails).toHaveLength(2);
    expect(mails[1].subject).toBe("You have an account already");
    await expect(
      checkCredentials({ email, password: "another password", address: null }),
    ).rejects.toMatchObject({
      kind: "invalid",
    });
  });

  it("sends one recipient at most five mails an hour, known or not", async () => {
    for (let i = 0; i < 5; i += 1) await requestReset(email);
    await expect(joinAccount({ name: "Ines Roth", email, password })).rejects.toMatchObject({
      kind: "limitReached",
    });
    expect(await sentMails(email)).toHaveLength(5);
  });
});

describe("verifying the address", () => {
  it("works once", async () => {
    const { userId, secret } = await join();
    await verifyEmail(secret);
    const [user] = await db.select().from(users).where(eq(users.id, userId));
    expect(user.emailVerifiedAt).not.toBeNull();
    await expect(verifyEmail(secret)).rejects.toMatchObject({ kind: "invalid" });
  });

  it("works once even when the link is opened twice at the same moment", async () => {
    const { secret } = await join();
    const both = await Promise.allSettled([verifyEmail(secret), verifyEmail(secret)]);
    expect(both.map((one) => one.status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  it("does not work after an hour", async () => {
    const { userId, secret } = await join();
    await db
      .update(tokens)
      .set({ expiresAt: sql`now() - interval '1 second'` })
      .where(eq(tokens.userId, userId));
    await expect(verifyEmail(secret)).rejects.toMatchObject({ kind: "invalid" });
    expect(await isLinkUsable(secret, "verifyEmail")).toBe(false);
  });

  it("does not take a link that was mailed for a new password", async () => {
    await join();
    await requestReset(email);
    const reset = linkIn((await sentMails(email))[1], "reset");
    await expect(verifyEmail(reset)).rejects.toMatchObject({ kind: "invalid" });
  });

  it("can be asked for again until it is done", async () => {
    const { userId } = await join();
    const viewer = await viewerOfSession(await startSession(userId, null));
    expect(() => requireVerified(viewer)).toThrowError(expect.objectContaining({ kind: "forbidden" }));
    await resendVerification(viewer);
    await verifyEmail(linkIn((await sentMails(email))[1], "verify"));
    const verified = await viewerOfSession(await startSession(userId, null));
    expect(requireVerified(verified).userId).toBe(userId);
    await expect(resendVerification(verified)).rejects.toMatchObject({ kind: "conflict" });
  });
});

describe("a forgotten password", () => {
  it("gives an unknown address the same answer, and its owner a mail without a link to a password", async () => {
    expect(await requestReset(email)).toBeUndefined();
    const [mail] = await sentMails(email);
    expect(mail.subject).toBe("No account with this address");
    expect(mail.text).not.toContain("/reset/");
  });

  it("is replaced by a link that works once, and every session ends", async () => {
    const { userId } = await join();
    const session = await startSession(userId, null);
    await requestReset(email);
    const secret = linkIn((await sentMails(email))[1], "reset");

    await resetPassword(secret, "quite another phrase");

    expect(await viewerOfSession(session)).toBeNull();
    expect(await checkCredentials({ email, password: "quite another phrase", address: null })).toEqual({
      userId,
    });
    await expect(checkCredentials({ email, password, address: null })).rejects.toMatchObject({
      kind: "invalid",
    });
    await expect(resetPassword(secret, "a third long phrase")).rejects.toMatchObject({ kind: "invalid" });
  });

  it("ends the other links for a new password too", async () => {
    await join();
    await requestReset(email);
    await requestReset(email);
    const [, first, second] = await sentMails(email);
    await resetPassword(linkIn(second, "reset"), "quite another phrase");
    await expect(resetPassword(linkIn(first, "reset"), "a third long phrase")).rejects.toMatchObject({
      kind: "invalid",
    });
  });

  it("counts the address as verified, since its owner read the mail", async () => {
    const { userId } = await join();
    await requestReset(email);
    await resetPassword(linkIn((await sentMails(email))[1], "reset"), "quite another phrase");
    const [user] = await db.select().from(users).where(eq(users.id, userId));
    expect(user.emailVerifiedAt).not.toBeNull();
  });

  it("leaves the link usable when the new password is the owner's address", async () => {
    await join();
    await requestReset(email);
    const secret = linkIn((await sentMails(email))[1], "reset");
    await expect(resetPassword(secret, email)).rejects.toMatchObject({
      kind: "invalid",
      details: { fields: { password: expect.any(String) } },
    });
    await resetPassword(secret, "quite another phrase");
  });
});
