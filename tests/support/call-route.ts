import { RouterContextProvider } from "react-router";
import type { Viewer } from "@/app/features/accounts/viewer";
import { viewerContext } from "@/app/http/session.server";

/** What every loader and action of the API takes, whatever its route's generated types add. */
type RouteFunction = (args: never) => Promise<Response>;

/** Calls a loader or an action as the router does, for a viewer whom the middleware would have found. */
export async function callRoute(
  route: RouteFunction,
  request: Request,
  { params = {}, viewer = null }: { params?: Record<string, string>; viewer?: Viewer } = {},
): Promise<Response> {
  const context = new RouterContextProvider();
  context.set(viewerContext, viewer);
  return await (route as (args: unknown) => Promise<Response>)({ request, params, context });
}

export const get = (path: string, headers: Record<string, string> = {}) =>
  new Request(`http://127.0.0.1:3000/api/v1${path}`, { headers });

export const postJson = (path: string, body: unknown) =>
  new Request(`http://127.0.0.1:3000/api/v1${path}`, {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify(body),
  });
