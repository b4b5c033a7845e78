import { RouterContextProvider } from "react-router";
import { describe, expect, it } from "vitest";
import { contentSecurity, contentSecurityPolicy, nonceContext } from "@/app/http/content-security.server";
import { isFromThisSite } from "@/app/http/same-origin.server";
import { useDatabase } from "../support/database";

useDatabase();

function directives(policy: string): Record<string, string> {
  return Object.fromEntries(
    policy.split("; ").map((one) => [one.slice(0, one.indexOf(" ")), one.slice(one.indexOf(" ") + 1)]),
  );
}

async function answer(): Promise<{ nonce: string; headers: Headers }> {
  const context = new RouterContextProvider();
  const request = new Request("http://127.0.0.1:3000/");
  const args = { request, context, params: {}, pattern: "/", url: new URL(request.url) };
  const response = await contentSecurity(args, async () => new Response("page"));
  if (!(response instanceof Response)) throw new TypeError("The middleware answered nothing.");
  return { nonce: context.get(nonceContext), headers: response.headers };
}

describe("the content policy of a page", () => {
  it("runs scripts and styles of this site and those with the nonce, none that is written inline or evaluated", () => {
    const policy = directives(contentSecurityPolicy("abc", false));
    expect(policy["default-src"]).toBe("'self'");
    expect(policy["script-src"]).toBe("'self' 'nonce-abc'");
    expect(policy["style-src"]).toBe("'self' 'nonce-abc'");
    expect(policy["style-src-attr"]).toBe("'unsafe-inline'");
    expect(policy["frame-ancestors"]).toBe("'none'");
    expect(policy["base-uri"]).toBe("'none'");
    expect(policy["form-action"]).toBe("'self'");
    expect(contentSecurityPolicy("abc", false)).not.toContain("unsafe-eval");
  });

  it("has a nonce that is new with every answer and reaches the page", async () => {
    const [one, two] = [await answer(), await answer()];
    expect(one.nonce).not.toBe(two.nonce);
    expect(one.headers.get("Content-Security-Policy")).toContain(`'nonce-${one.nonce}'`);
  });

  it("comes with nosniff and a referrer for this site only", async () => {
    const { headers } = await answer();
    expect(headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(headers.get("Referrer-Policy")).toBe("same-origin");
  });
});

describe("a request that changes something", () => {
  const from = (method: string, headers: Record<string, string>) =>
    isFromThisSite(new Request("http://127.0.0.1:3000/sign-out", { method, headers }));

  it("is taken from a page of this site, or from a client that is no browser", () => {
    expect(from("POST", { Origin: "http://127.0.0.1:3000" })).toBe(true);
    expect(from("POST", { "Sec-Fetch-Site": "same-origin" })).toBe(true);
    expect(from("POST", {})).toBe(true);
  });

  it.each([
    { Origin: "https://elsewhere.example" },
    { Origin: "null" },
    { "Sec-Fetch-Site": "cross-site" },
    { "Sec-Fetch-Site": "same-site" },
  ])("is refused with %o", (headers) => {
    expect(from("POST", headers as unknown as Record<string, string>)).toBe(false);
    expect(from("GET", headers as unknown as Record<string, string>)).toBe(true);
  });
});
