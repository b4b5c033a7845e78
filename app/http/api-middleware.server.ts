import type { RouterContextProvider } from "react-router";
import { viewerOfApiKey } from "@/app/features/api-keys/viewer-of-api-key.server";
import { viewerOfSession } from "@/app/features/accounts/sessions.server";
import type { Viewer } from "@/app/features/accounts/viewer";
import { requireScope } from "@/app/features/accounts/viewer-policy";
import { unauthenticated } from "@/app/platform/errors";
import { plainProblem, problemJson } from "./answers.server";
import { clientAddressOf } from "./client-address.server";
import { createRateLimiter } from "./rate-limit.server";
import { sessionSecretOf, viewerContext } from "./session.server";

const takeRead = createRateLimiter({ name: "reads", limit: 600, windowSeconds: 60 });
const takeWrite = createRateLimiter({ name: "writes", limit: 60, windowSeconds: 60 });
const takeScore = createRateLimiter({ name: "scores", limit: 30, windowSeconds: 60 });

interface ApiRequest {
  request: Request;
  context: Readonly<RouterContextProvider>;
}

/** Who calls, how often, and every error as problem+json. */
export async function answerApiRequest(
  { request, context }: ApiRequest,
  next: () => Promise<Response>,
): Promise<Response> {
  let viewer: Viewer;
  try {
    viewer = await apiViewer(request);
  } catch (error) {
    return problemJson(error);
  }
  context.set(viewerContext, viewer);

  const { isAllowed, headers } = takeFor(request, viewer);
  const response = isAllowed
    ? asProblem(await next(), request)
    : plainProblem(429, "Too many calls. Retry-After says in how many seconds the next one is taken.");
  for (const [name, value] of Object.entries(headers)) response.headers.set(name, value);
  return response;
}

/**
 * A write is taken with a token only, never with a cookie, so no other site can make one. A read may come with
 * the session of a page.
 */
async function apiViewer(request: Request): Promise<Viewer> {
  const authorization = request.headers.get("Authorization");
  if (authorization !== null) {
    const token = /^Bearer +(\S+)$/i.exec(authorization.trim())?.[1];
    const viewer = token === undefined ? null : await viewerOfApiKey(token);
    if (viewer === null) {
      throw unauthenticated("The token is unknown, expired or revoked. Send Authorization: Bearer <token>.");
    }
    return isRead(request) ? requireScope(viewer, "read") : viewer;
  }
  if (!isRead(request)) return null;
  const secret = await sessionSecretOf(request);
  return secret === null ? null : viewerOfSession(secret);
}

function takeFor(request: Request, viewer: Viewer) {
  const address = clientAddressOf(request) ?? "unknown address";
  if (isScore(request)) return takeScore(address);
  const caller = viewer?.apiKeyId ?? address;
  return isRead(request) ? takeRead(caller) : takeWrite(caller);
}

function isRead(request: Request): boolean {
  return request.method === "GET" || request.method === "HEAD";
}

function isScore(request: Request): boolean {
  return !isRead(request) && /^\/api\/v1\/score\/?$/.test(new URL(request.url).pathname);
}

/** The router's own answers, for a method without an action and for an error it caught, in the API's shape. */
function asProblem(response: Response, request: Request): Response {
  if (response.status === 405) {
    return plainProblem(405, `${new URL(request.url).pathname} does not take ${request.method}.`);
  }
  const isCaughtError =
    response.status >= 500 && response.headers.get("Content-Type")?.startsWith("text/plain");
  if (!isCaughtError) return response;
  return plainProblem(
    response.status,
    "The call could not be answered because of an error of the server. Try again later.",
  );
}
