import { env } from "@/app/platform/env.server";

/**
 * Whether a request that changes something comes from a page of this site.
 *
 * The router checks this for pages only, not for resource routes such as /sign-out. A client that sends neither
 * header is no browser and carries nobody's cookie unasked.
 */
export function isFromThisSite(request: Request): boolean {
  if (request.method === "GET" || request.method === "HEAD") return true;
  const origin = request.headers.get("Origin");
  if (origin !== null)
    return origin === new URL(request.url).origin || origin === new URL(env.PUBLIC_URL).origin;
  const site = request.headers.get("Sec-Fetch-Site");
  return site === null || site === "same-origin" || site === "none";
}
