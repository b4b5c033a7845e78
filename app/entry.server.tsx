import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { isbot } from "isbot";
import type { ReactNode } from "react";
import { renderToPipeableStream } from "react-dom/server";
import {
  type EntryContext,
  type HandleErrorFunction,
  isRouteErrorResponse,
  type RouterContextProvider,
  ServerRouter,
} from "react-router";
import { NonceContext } from "@/app/components/layout/nonce-context";
import { nonceContext } from "@/app/http/content-security.server";
import { logger } from "@/app/platform/logger.server";

export const streamTimeout = 5_000;

/** What no route foresaw. The reader learns only that it happened. */
export const handleError: HandleErrorFunction = (error, { request }) => {
  if (request.signal.aborted || isRouteErrorResponse(error)) return;
  const { pathname } = new URL(request.url);
  logger.error("a request failed", { method: request.method, path: pathname, error });
};

export default async function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  context: RouterContextProvider,
): Promise<Response> {
  headers.set("Content-Type", "text/html; charset=utf-8");
  if (request.method === "HEAD") return new Response(null, { status, headers });
  const nonce = context.get(nonceContext);
  const body = await render(
    <NonceContext value={nonce}>
      <ServerRouter context={routerContext} url={request.url} nonce={nonce} />
    </NonceContext>,
    nonce,
    isbot(request.headers.get("User-Agent") ?? ""),
  );
  return new Response(createReadableStreamFromReadable(body), { status, headers });
}

function render(page: ReactNode, nonce: string, waitsForAll: boolean): Promise<PassThrough> {
  return new Promise((resolve, reject) => {
    const body = new PassThrough();
    const send = () => {
      pipe(body);
      resolve(body);
    };
    const { pipe, abort } = renderToPipeableStream(page, {
      nonce,
      ...(waitsForAll ? { onAllReady: send } : { onShellReady: send }),
      onShellError: reject,
      onError: (error) => logger.error("a page could not be rendered", { error }),
    });
    const timeout = setTimeout(abort, streamTimeout + 1_000);
    body.on("close", () => clearTimeout(timeout));
  });
}
