import { RouterContextProvider } from "react-router";
import { beforeEach, describe, expect, it } from "vitest";
import { viewerOfSession } from "@/app/features/accounts/sessions.server";
import type { Viewer } from "@/app/features/accounts/viewer";
import { viewerOfApiKey } from "@/app/features/api-keys/viewer-of-api-key.server";
import { sessionSecretOf, viewerContext } from "@/app/http/session.server";
import * as forgot from "@/app/routes/accounts/forgot";
import * as join from "@/app/routes/accounts/join";
import * as reset from "@/app/routes/accounts/reset";
import * as show from "@/app/routes/accounts/show";
import * as signInPage from "@/app/routes/accounts/sign-in";
import * as signOutRoute from "@/app/routes/accounts/sign-out";
import * as teams from "@/app/routes/accounts/teams";
import * as tokens from "@/app/routes/accounts/tokens";
import * as verify from "@/app/routes/accounts/verify";
import { linkIn, sentMails } from "../../features/accounts/sent-mails";
import { useDatabase } from "../../support/database";

useDatabase();

const password = "seven grey herons";
let serial = 0;
let email = "";

beforeEach(() => {
  serial += 1;
  email = `person${serial}@example.org`;
});

interface Call {
  cookie?: string;
  params?: Record<string, string>;
  fields?: Record<string, string> | URLSearchParams;
}

/** Calls a loader or an action as the router does, for the viewer whose cookie is sent. */
async function call(run: (args: never) => unknown, path: string, { cookie, params = {}, fields }: Call = {}) {
  const request = new Request(`http://127.0.0.1:3000${path}`, {
    method: fields ? "POST" : "GET",
    headers: cookie ? { Cookie: cookie } : {},
    body: fields ? new URLSearchParams(fields) : null,
  });
  const context = new RouterContextProvider();
  const secret = await sessionSecretOf(request);
  const viewer: Viewer = secret === null ? null : await viewerOfSession(secret);
  context.set(viewerContext, viewer);
  const answer: unknown = await (run as (args: unknown) => unknown)({ request, context, params });
  return answer;
}

async function redirected(answer: Promise<unknown>): Promise<{ to: string | null; cookie: string }> {
  const response: unknown = await answer;
  if (!(response instanceof Response)) throw new TypeError(`Not redirected: ${JSON.stringify(response)}`);
  const cookie = (response.headers.get("Set-Cookie") ?? "").split(";")[0];
  return { to: response.headers.get("Location"), cookie };
}

const joined = () =>
  redirected(call(join.action, "/join", { fields: { name: "Ines Roth", email, password } }));
const signedIn = (path = "/sign-in", chosen = password) =>
  redirected(call(signInPage.action, path, { fields: { email, password: chosen } }));

async function verified(): Promise<void> {
  await joined();
  const token = linkIn((await sentMails(email))[0], "verify");
  await call(verify.action, `/verify/${token}`, { params: { token }, fields: {} });
}

describe("a newcomer", () => {
  it("joins, verifies the address, signs in where they wanted to go, and signs out", async () => {
    expect((await joined()).to).toBe("/join?sent=yes");
    const token = linkIn((await sentMails(email))[0], "verify");
    const params = { token };
    expect(await call(verify.loader, `/verify/${token}`, { params })).toEqual({ isUsable: true });
    expect(await call(verify.loader, `/verify/${token}`, { params })).toEqual({ isUsable: true });
    const done = await redirected(call(verify.action, `/verify/${token}`, { params, fields: {} }));
    expect(done.to).toBe("/sign-in?done=verified");

    const { to, cookie } = await signedIn("/sign-in?next=%2Fsubmit");
    expect(to).toBe("/submit");
    expect(await call(show.loader, "/account", { cookie })).toMatchObject({
      account: { email, role: "author", isEmailVerified: true },
      sessions: [{ isCurrent: true }],
    });

    await redirected(call(signOutRoute.action, "/sign-out", { cookie, fields: {} }));
    await expect(call(show.loader, "/account", { cookie })).rejects.toMatchObject({ status: 302 });
  });

  it("gets the answer of a newcomer for an address that has an account already", async () => {
    const first = await joined();
    expect(await joined()).toEqual(first);
  });

  it("learns below each field what is wrong with it", async () => {
    const answer = await call(join.action, "/join", {
      fields: { name: "", email: "ines", password: "short" },
    });
    expect(answer).toMatchObject({
      init: { status: 422 },
      data: {
        fields: { name: expect.any(String), email: expect.any(String), password: expect.any(String) },
        values: { name: "", email: "ines" },
      },
    });
  });

  it("signs in before verifying, and can have the link sent again", async () => {
    await joined();
    const { cookie } = await signedIn();
    expect(await call(show.loader, "/account", { cookie })).toMatchObject({
      account: { isEmailVerified: false },
    });
    await call(show.action, "/account", { cookie, fields: { intent: "resend" } });
    expect(await sentMails(email)).toHaveLength(2);
    await expect(
      call(teams.action, "/account/teams", { cookie, fields: { name: `Team ${serial}` } }),
    ).rejects.toMatchObject({ init: { status: 403 } });
  });
});

describe("signing in", () => {
  it("never leads to another site", async () => {
    await verified();
    expect((await signedIn("/sign-in?next=%2F%2Felsewhere.example")).to).toBe("/account");
  });

  it("says the same for a wrong password and an unknown address", async () => {
    await verified();
    const answerFor = (fields: Record<string, string>) => call(signInPage.action, "/sign-in", { fields });
    const wrong = await answerFor({ email, password: "not the password" });
    const unknown = await answerFor({ email: "nobody@example.org", password });
    expect(wrong).toMatchObject({ init: { status: 422 }, data: { message: expect.any(String), fields: {} } });
    expect({ ...(unknown as object), data: null }).toEqual({ ...(wrong as object), data: null });
    expect((unknown as { data: { message: string } }).data.message).toBe(
      (wrong as { data: { message: string } }).data.message,
    );
  });

  it("is refused with the seconds to wait after too many failures", async () => {
    await verified();
    let last: unknown;
    for (let i = 0; i < 11; i += 1) {
      last = await call(signInPage.action, "/sign-in", { fields: { email, password: "not the password" } });
    }
    expect(last).toMatchObject({
      init: { status: 429, headers: { "Retry-After": expect.stringMatching(/^\d+$/) } },
    });
  });

  it("is not offered to somebody who is signed in", async () => {
    await verified();
    const { cookie } = await signedIn();
    await expect(call(signInPage.loader, "/sign-in", { cookie })).rejects.toMatchObject({ status: 302 });
  });
});

describe("signing out", () => {
  it("takes POST only, so that no link or image can do it", async () => {
    await verified();
    const { cookie } = await signedIn();
    expect(await call(signOutRoute.loader, "/sign-out", { cookie })).toMatchObject({ status: 405 });
    expect(await call(show.loader, "/account", { cookie })).toMatchObject({ account: { email } });
  });

  it("can end every other session and keep this one", async () => {
    await verified();
    const there = await signedIn();
    const here = await signedIn();
    await call(show.action, "/account", { cookie: here.cookie, fields: { intent: "endOthers" } });
    await expect(call(show.loader, "/account", { cookie: there.cookie })).rejects.toMatchObject({
      status: 302,
    });
    expect(await call(show.loader, "/account", { cookie: here.cookie })).toMatchObject({
      account: { email },
    });
  });
});

describe("a forgotten password", () => {
  it("is set anew by the mailed link, which works once and ends every session", async () => {
    await verified();
    const { cookie } = await signedIn();
    const asked = await redirected(call(forgot.action, "/forgot", { fields: { email } }));
    const unknown = await redirected(
      call(forgot.action, "/forgot", { fields: { email: "nobody@example.org" } }),
    );
    expect(unknown).toEqual(asked);

    const token = linkIn((await sentMails(email))[1], "reset");
    const params = { token };
    const set = () =>
      call(reset.action, `/reset/${token}`, { params, fields: { password: "quite another phrase" } });
    expect((await redirected(set())).to).toBe("/sign-in?done=reset");
    expect(await set()).toMatchObject({ init: { status: 422 } });
    expect(await call(reset.loader, `/reset/${token}`, { params })).toEqual({ isUsable: false });
    await expect(call(show.loader, "/account", { cookie })).rejects.toMatchObject({ status: 302 });
    expect((await signedIn("/sign-in", "quite another phrase")).to).toBe("/account");
  });
});

describe("API tokens", () => {
  it("are made with scopes and an expiry, shown once, and revoked", async () => {
    await verified();
    const { cookie } = await signedIn();
    const fields = new URLSearchParams([
      ["name", "CI job"],
      ["scopes", "read"],
      ["scopes", "submit"],
      ["expiresInDays", "30"],
    ]);
    const made = (await call(tokens.action, "/account/tokens", { cookie, fields })) as { secret: string };
    expect(await viewerOfApiKey(made.secret)).toMatchObject({ email, scopes: ["read", "submit"] });

    const page = (await call(tokens.loader, "/account/tokens", { cookie })) as { keys: { id: string }[] };
    expect(JSON.stringify(page)).not.toContain(made.secret);
    expect(page).toMatchObject({ keys: [{ name: "CI job" }], scopes: ["read", "submit"] });

    await call(tokens.action, "/account/tokens?revoke", { cookie, fields: { id: page.keys[0].id } });
    expect(await viewerOfApiKey(made.secret)).toBeNull();
  });
});

describe("teams", () => {
  it("are made under a free name and listed", async () => {
    await verified();
    const { cookie } = await signedIn();
    const make = () => call(teams.action, "/account/teams", { cookie, fields: { name: "Harbour Group" } });
    expect((await redirected(make())).to).toBe("/account/teams?created=harbour-group");
    expect(await make()).toMatchObject({
      init: { status: 409 },
      data: { fields: { name: expect.any(String) } },
    });
    expect(await call(teams.loader, "/account/teams", { cookie })).toMatchObject({
      teams: [{ name: "Harbour Group", role: "owner" }],
    });
  });
});

describe("a visitor", () => {
  it.each([
    ["/account", show.loader],
    ["/account/tokens", tokens.loader],
    ["/account/teams", teams.loader],
  ])("is sent from %s to the sign-in and back", async (path, loader) => {
    const thrown: unknown = await call(loader, path).catch((error: unknown) => error);
    expect((thrown as Response).headers.get("Location")).toBe(`/sign-in?next=${encodeURIComponent(path)}`);
  });

  it.each([
    ["/account", show.action, { intent: "endOthers" }],
    ["/account/tokens", tokens.action, { name: "a", scopes: "read", expiresInDays: "30" }],
    ["/account/teams", teams.action, { name: "Harbour" }],
  ])("changes nothing by posting to %s", async (path, action, fields) => {
    await expect(call(action, path, { fields })).rejects.toMatchObject({ status: 302 });
  });
});
