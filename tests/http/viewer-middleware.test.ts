import { type MiddlewareFunction, RouterContextProvider, createStaticHandler } from "react-router";
import { beforeAll, describe, expect, it } from "vitest";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import { answerPage } from "@/app/http/answers.server";
import { signIn, viewerContext } from "@/app/http/session.server";
import { rootMiddleware } from "@/app/http/viewer-middleware.server";
import { requireAccount } from "@/app/features/accounts/viewer-policy";
import { useDatabase } from "../support/database";

useDatabase();

let Cookie = "";
let signOuts = 0;

beforeAll(async () => {
  const person = { name: "Ines Roth", email: "ines@example.org", password: "seven grey herons" };
  const { userId } = await ensureAccount({ ...person, role: "author" });
  const headers = new Headers(await signIn(new Request("http://127.0.0.1:3000/"), userId));
  Cookie = (headers.get("Set-Cookie") ?? "").split(";")[0];
});

/** The router itself with the root's middleware before two resource routes. */
const router = createStaticHandler([
  {
    id: "root",
    path: "/",
    middleware: rootMiddleware as MiddlewareFunction[],
    children: [
      {
        id: "who",
        path: "who",
        loader: ({ request, context }) =>
          answerPage(request, async () => Response.json(requireAccount(context.get(viewerContext)).email)),
      },
      {
        id: "sign-out",
        path: "sign-out",
        action: () => {
          signOuts += 1;
          return new Response("signed out");
        },
      },
    ],
  },
]);

async function ask(path: string, init: RequestInit): Promise<Response> {
  const answer: unknown = await router.queryRoute(new Request(`http://127.0.0.1:3000${path}`, init), {
    requestContext: new RouterContextProvider(),
    generateMiddlewareResponse: async (query) => {
      try {
        return (await query(new Request(`http://127.0.0.1:3000${path}`, init))) as Response;
      } catch (error) {
        if (error instanceof Response) return error;
        throw error;
      }
    },
  });
  if (!(answer instanceof Response))
    throw new TypeError("The router answered something else than a response.");
  return answer;
}

describe("a page", () => {
  it("knows its viewer by the cookie and keeps what they see out of every cache", async () => {
    const response = await ask("/who", { headers: { Cookie } });
    expect(await response.json()).toBe("ines@example.org");
    expect(response.headers.get("Cache-Control")).toBe("private, no-store");
  });

  it("sends a visitor to the sign-in and back", async () => {
    const response = await ask("/who?a=1", {});
    expect(response.status).toBe(302);
    expect(response.headers.get("Location")).toBe("/sign-in?next=%2Fwho%3Fa%3D1");
  });

  it("takes a token of the API for nobody", async () => {
    expect((await ask("/who", { headers: { Authorization: "Bearer bks_any" } })).status).toBe(302);
  });

  it("answers with the content policy, also where it refuses", async () => {
    for (const init of [{ headers: { Cookie } }, {}]) {
      expect((await ask("/who", init)).headers.get("Content-Security-Policy")).toContain(
        "default-src 'self'",
      );
    }
  });
});

describe("a resource that takes forms", () => {
  it("takes one from this site", async () => {
    const Origin = "http://127.0.0.1:3000";
    expect((await ask("/sign-out", { method: "POST", headers: { Cookie, Origin } })).status).toBe(200);
    expect(signOuts).toBe(1);
  });

  it("refuses one from another site before it runs", async () => {
    const Origin = "https://elsewhere.example";
    expect((await ask("/sign-out", { method: "POST", headers: { Cookie, Origin } })).status).toBe(403);
    expect(signOuts).toBe(1);
  });
});
