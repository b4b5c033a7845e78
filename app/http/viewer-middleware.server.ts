import type { MiddlewareFunction } from "react-router";
import { viewerOfSession } from "@/app/features/accounts/sessions.server";
import { forbidden } from "@/app/platform/errors";
import { answerApiRequest } from "./api-middleware.server";
import { toResponse } from "./answers.server";
import { contentSecurity } from "./content-security.server";
import { isFromThisSite } from "./same-origin.server";
import { sessionSecretOf, viewerContext } from "./session.server";

/** For pages: whose session the cookie names. The API decides for itself. */
const pageViewer: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  if (new URL(request.url).pathname.startsWith("/api/")) return answerApiRequest({ request, context }, next);
  if (!isFromThisSite(request)) throw toResponse(forbidden("This form was sent from another site."));

  const secret = await sessionSecretOf(request);
  const viewer = secret === null ? null : await viewerOfSession(secret);
  context.set(viewerContext, viewer);

  const response = await next();
  if (!response.headers.has("Cache-Control")) {
    // A page carries its nonce and what its viewer may see.
    response.headers.set("Cache-Control", viewer === null ? "private, no-cache" : "private, no-store");
  }
  return response;
};

/** What `app/root.tsx` exports as its middleware, in this order. */
export const rootMiddleware: MiddlewareFunction<Response>[] = [contentSecurity, pageViewer];
