import { beforeAll, describe, expect, it } from "vitest";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import { viewerOfSession } from "@/app/features/accounts/sessions.server";
import { authenticate, sessionSecretOf, signIn, signOut } from "@/app/http/session.server";
import { useDatabase } from "../support/database";

useDatabase();

const email = "ines@example.org";
const password = "seven grey herons";
let userId = "";

beforeAll(async () => {
  ({ userId } = await ensureAccount({ name: "Ines Roth", email, password, role: "author" }));
});

const post = (fields: Record<string, string>) =>
  new Request("http://127.0.0.1:3000/sign-in", { method: "POST", body: new URLSearchParams(fields) });

function withCookie(headers: HeadersInit): { request: Request; setCookie: string } {
  const setCookie = new Headers(headers).get("Set-Cookie") ?? "";
  return {
    setCookie,
    request: new Request("http://127.0.0.1:3000/", { headers: { Cookie: setCookie.split(";")[0] } }),
  };
}

describe("the form strategy", () => {
  it("answers whose credentials the form holds", async () => {
    expect(await authenticate(post({ email: " INES@example.org", password }))).toEqual({
      userId,
    });
  });

  it("refuses a wrong password and an empty form with the errors of the use-case", async () => {
    await expect(authenticate(post({ email, password: "x" }))).rejects.toMatchObject({
      kind: "invalid",
    });
    await expect(authenticate(post({}))).rejects.toMatchObject({
      details: { fields: { email: expect.any(String), password: expect.any(String) } },
    });
  });
});

describe("the session's cookie", () => {
  it("cannot be read by scripts nor sent along by other sites' forms, and lasts 12 hours", async () => {
    const { setCookie } = withCookie(await signIn(post({}), userId));
    expect(setCookie).toMatch(/; HttpOnly/);
    expect(setCookie).toMatch(/; SameSite=Lax/);
    expect(setCookie).toMatch(/; Max-Age=43200/);
    expect(setCookie).toMatch(/; Path=\//);
  });

  it("carries the secret of a session of the account", async () => {
    const { request } = withCookie(await signIn(post({}), userId));
    expect(await viewerOfSession((await sessionSecretOf(request)) ?? "")).toMatchObject({ userId });
  });

  it("is a new one at every sign-in, and the former session ends", async () => {
    const former = withCookie(await signIn(post({}), userId));
    const next = withCookie(await signIn(former.request, userId));
    expect(next.setCookie).not.toBe(former.setCookie);
    expect(await viewerOfSession((await sessionSecretOf(former.request)) ?? "")).toBeNull();
    expect(await viewerOfSession((await sessionSecretOf(next.request)) ?? "")).not.toBeNull();
  });

  it("is cleared by signing out, and the session ends in the database too", async () => {
    const { request } = withCookie(await signIn(post({}), userId));
    const secret = (await sessionSecretOf(request)) ?? "";
    expect(new Headers(await signOut(request)).get("Set-Cookie")).toMatch(/Max-Age=0/);
    expect(await viewerOfSession(secret)).toBeNull();
  });

  it("means nobody where it is missing or mangled", async () => {
    expect(await sessionSecretOf(new Request("http://127.0.0.1:3000/"))).toBeNull();
    const mangled = new Request("http://127.0.0.1:3000/", { headers: { Cookie: "session=%%%" } });
    expect(await viewerOfSession((await sessionSecretOf(mangled)) ?? "")).toBeNull();
  });
});
