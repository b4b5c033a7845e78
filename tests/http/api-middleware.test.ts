import { RouterContextProvider } from "react-router";
import { beforeAll, describe, expect, it } from "vitest";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import { loadAccount } from "@/app/features/accounts/load-account.server";
import type { Viewer } from "@/app/features/accounts/viewer";
import { createApiKey } from "@/app/features/api-keys/create-api-key.server";
import { answerApiRequest } from "@/app/http/api-middleware.server";
import { clientAddressHeader } from "@/app/http/client-address.server";
import { signIn, viewerContext } from "@/app/http/session.server";
import type { ApiScope } from "@/drizzle/enums";
import { useDatabase } from "../support/database";

useDatabase();

let account: Viewer;
let userId = "";
let addresses = 0;

beforeAll(async () => {
  const person = { name: "Ines Roth", email: "ines@example.org", password: "seven grey herons" };
  ({ userId } = await ensureAccount({ ...person, role: "author" }));
  account = await loadAccount(userId, { scopes: null, apiKeyId: null });
});

const newAddress = () => `192.0.2.${(addresses += 1)}`;

async function token(...scopes: ApiScope[]): Promise<string> {
  return `Bearer ${(await createApiKey(account, { name: "CI", scopes, expiresInDays: 1 })).secret}`;
}

async function call(
  method: string,
  path: string,
  headers: Record<string, string>,
  answer = Response.json({}),
) {
  const context = new RouterContextProvider();
  const request = new Request(`http://127.0.0.1:3000${path}`, {
    method,
    headers: { [clientAddressHeader]: newAddress(), ...headers },
  });
  let isReached = false;
  const response = await answerApiRequest({ request, context }, async () => {
    isReached = true;
    return answer.clone();
  });
  return { response, isReached, viewer: isReached ? context.get(viewerContext) : null };
}

describe("who calls the API", () => {
  it("is a visitor without a token", async () => {
    expect(await call("GET", "/api/v1/problems", {})).toMatchObject({ isReached: true, viewer: null });
  });

  it("is the holder of the token, with its scopes", async () => {
    const { viewer } = await call("POST", "/api/v1/submissions", { Authorization: await token("submit") });
    expect(viewer).toMatchObject({ userId, scopes: ["submit"] });
  });

  it("is nobody, with 401, for a token that is unknown or malformed", async () => {
    for (const header of ["Bearer bks_unknown", "Bearer", "Basic aW5lczpwYXNz", "bks_unknown"]) {
      const { response, isReached } = await call("GET", "/api/v1/problems", { Authorization: header });
      expect([header, response.status, isReached]).toEqual([header, 401, false]);
      expect(response.headers.get("Content-Type")).toBe("application/problem+json");
      expect(response.headers.get("WWW-Authenticate")).toContain("Bearer");
    }
  });

  it("reads with a token only where its scopes name reading", async () => {
    const { response } = await call("GET", "/api/v1/submissions/1", { Authorization: await token("submit") });
    expect(response.status).toBe(403);
    expect(
      (await call("GET", "/api/v1/submissions/1", { Authorization: await token("read") })).isReached,
    ).toBe(true);
  });

  it("may read with the session of a page, but never write with it", async () => {
    const headers = new Headers(await signIn(new Request("http://127.0.0.1:3000/"), userId));
    const Cookie = (headers.get("Set-Cookie") ?? "").split(";")[0];
    expect((await call("GET", "/api/v1/submissions/1", { Cookie })).viewer).toMatchObject({ userId });
    expect((await call("POST", "/api/v1/submissions", { Cookie })).viewer).toBeNull();
    expect((await call("DELETE", "/api/v1/submissions/1", { Cookie })).viewer).toBeNull();
  });
});

describe("the limits of the API", () => {
  it("say on every answer what is left", async () => {
    const { response } = await call("GET", "/api/v1/problems", {});
    expect(response.headers.get("RateLimit-Policy")).toBe('"reads";q=600;w=60');
    expect(response.headers.get("RateLimit")).toMatch(/^"reads";r=599;t=\d+$/);
  });

  it("are 60 writes a minute for a token, wherever they come from", async () => {
    const Authorization = await token("submit");
    let refused = null;
    for (let i = 0; i < 62 && refused === null; i += 1) {
      const { response, isReached } = await call("POST", "/api/v1/submissions", { Authorization });
      if (!isReached) refused = { after: i, response };
    }
    expect(refused?.after).toBeGreaterThanOrEqual(60);
    expect(refused?.response.status).toBe(429);
    expect(refused?.response.headers.get("Content-Type")).toBe("application/problem+json");
    expect(Number(refused?.response.headers.get("Retry-After"))).toBeGreaterThan(0);
  });

  it("are 30 scores a minute for a network address, with or without a token", async () => {
    const address = { [clientAddressHeader]: newAddress() };
    const statuses: number[] = [];
    for (let i = 0; i < 32; i += 1)
      statuses.push((await call("POST", "/api/v1/score", address)).response.status);
    expect(statuses.slice(0, 30)).toEqual(Array(30).fill(200));
    expect(statuses).toContain(429);
    expect((await call("POST", "/api/v1/score", {})).response.status).toBe(200);
  });
});

describe("an error of the router on the way", () => {
  it("is a problem where the address does not take the method", async () => {
    const answer = Response.json({ message: "no action" }, { status: 405 });
    const { response } = await call("DELETE", "/api/v1/problems", {}, answer);
    expect(response.status).toBe(405);
    expect(await response.json()).toMatchObject({
      status: 405,
      detail: "/api/v1/problems does not take DELETE.",
    });
  });

  it("is a problem that tells nothing of the cause where the server failed", async () => {
    const answer = new Response("Unexpected Server Error\n\nconnection refused", {
      status: 500,
      headers: { "Content-Type": "text/plain" },
    });
    const { response } = await call("GET", "/api/v1/problems", {}, answer);
    expect(response.headers.get("Content-Type")).toBe("application/problem+json");
    expect(await response.text()).not.toContain("connection refused");
  });

  it("leaves the 503 of readiness as it is", async () => {
    const { response } = await call(
      "GET",
      "/api/v1/ready",
      {},
      Response.json({ database: false }, { status: 503 }),
    );
    expect(await response.json()).toEqual({ database: false });
  });
});
