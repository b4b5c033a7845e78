import { randomBytes } from "node:crypto";
import { type MiddlewareFunction, createContext } from "react-router";
import { env } from "@/app/platform/env.server";

/** The nonce of this answer's scripts and styles: for ServerRouter, Links, Scripts and ScrollRestoration. */
export const nonceContext = createContext<string>("");

export function contentSecurityPolicy(nonce: string, isDevelopment: boolean): string {
  const own = `'self' 'nonce-${nonce}'`;
  return [
    "default-src 'self'",
    `script-src ${own}`,
    // Vite's development server adds its styles from scripts that know no nonce, and talks by WebSocket.
    `style-src ${isDevelopment ? "'self' 'unsafe-inline'" : own}`,
    // KaTeX and the charts' SVG place their parts by style attributes.
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' data:",
    "font-src 'self'",
    `connect-src 'self'${isDevelopment ? " ws:" : ""}`,
    "object-src 'none'",
    "base-uri 'none'",
    "frame-ancestors 'none'",
    "form-action 'self'",
  ].join("; ");
}

/** On every answer that passes the router. */
export const contentSecurity: MiddlewareFunction<Response> = async ({ context }, next) => {
  const nonce = randomBytes(16).toString("base64");
  context.set(nonceContext, nonce);
  const response = await next();
  const { headers } = response;
  headers.set("Content-Security-Policy", contentSecurityPolicy(nonce, isDevelopment));
  headers.set("X-Content-Type-Options", "nosniff");
  // "no-referrer" would make browsers send `Origin: null` with forms, which the router refuses.
  headers.set("Referrer-Policy", "same-origin");
  headers.set("Cross-Origin-Opener-Policy", "same-origin");
  if (isSecure) headers.set("Strict-Transport-Security", "max-age=31536000");
  return response;
};

const isDevelopment = import.meta.env.MODE === "development";
const isSecure = new URL(env.PUBLIC_URL).protocol === "https:";
