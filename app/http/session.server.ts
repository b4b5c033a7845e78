import { createContext, createCookie } from "react-router";
import { Authenticator } from "remix-auth";
import { FormStrategy } from "remix-auth-form";
import { signInForm } from "@/app/features/accounts/account-form";
import { endSession, sessionLifetimeSeconds, startSession } from "@/app/features/accounts/sessions.server";
import { checkCredentials } from "@/app/features/accounts/sign-in.server";
import type { Viewer } from "@/app/features/accounts/viewer";
import { env } from "@/app/platform/env.server";
import { clientAddressOf } from "./client-address.server";
import { readForm } from "./read-form.server";

/** Set by the root middleware; loaders and actions read it. */
export const viewerContext = createContext<Viewer>(null);

const isSecure = new URL(env.PUBLIC_URL).protocol === "https:";

const sessionCookie = createCookie(isSecure ? "__Host-session" : "session", {
  httpOnly: true,
  sameSite: "lax",
  secure: isSecure,
  path: "/",
  maxAge: sessionLifetimeSeconds,
});

const authenticator = new Authenticator<{ userId: string }>().use(
  new FormStrategy(async ({ request }) => {
    const input = await readForm(request, signInForm);
    return checkCredentials({ ...input, address: clientAddressOf(request) });
  }),
  "form",
);

/** Whose credentials the posted form holds. */
export async function authenticate(request: Request): Promise<{ userId: string }> {
  // The authenticator uses the body up, which the refused form still needs.
  return authenticator.authenticate("form", request.clone());
}

/** The secret that the cookie carries, as it came: only the database knows whether it is a session's. */
export async function sessionSecretOf(request: Request): Promise<string | null> {
  const value: unknown = await sessionCookie.parse(request.headers.get("Cookie"));
  return typeof value === "string" && value !== "" ? value : null;
}

/** Always a new session, so that none that was known before the sign-in outlives it. */
export async function signIn(request: Request, userId: string): Promise<HeadersInit> {
  const former = await sessionSecretOf(request);
  if (former !== null) await endSession(former);
  const secret = await startSession(userId, request.headers.get("User-Agent"));
  return { "Set-Cookie": await sessionCookie.serialize(secret) };
}

export async function signOut(request: Request): Promise<HeadersInit> {
  const secret = await sessionSecretOf(request);
  if (secret !== null) await endSession(secret);
  return forgetSession();
}

export async function forgetSession(): Promise<HeadersInit> {
  return { "Set-Cookie": await sessionCookie.serialize("", { maxAge: 0 }) };
}
