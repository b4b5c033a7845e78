import type { ApiScope, Role } from "@/drizzle/enums";
import { roles } from "@/drizzle/enums";
import { forbidden, unauthenticated } from "@/app/platform/errors";
import type { Account, Viewer } from "./viewer";

/** Each role may do what the ones before it may. */
export function hasRole(viewer: Viewer, role: Role): boolean {
  return viewer !== null && roles.indexOf(viewer.role) >= roles.indexOf(role);
}

/** A browser session may do all that the role may; a token only what its scopes name. */
export function hasScope(viewer: Viewer, scope: ApiScope): boolean {
  return viewer !== null && (viewer.scopes === null || viewer.scopes.includes(scope));
}

export function isMember(viewer: Viewer, teamId: string): boolean {
  return viewer !== null && viewer.teams.some((team) => team.id === teamId);
}

export function requireAccount(viewer: Viewer): Account {
  if (viewer === null) throw unauthenticated();
  return viewer;
}

export function requireVerified(viewer: Viewer): Account {
  const account = requireAccount(viewer);
  if (!account.isEmailVerified) {
    throw forbidden(
      "Your e-mail address is not verified yet. Follow the link in the mail, or ask for a new one on your account page.",
    );
  }
  return account;
}

export function requireRole(viewer: Viewer, role: Role): Account {
  const account = requireAccount(viewer);
  if (!hasRole(account, role)) {
    throw forbidden(`This needs the role ${role}; your account has the role ${account.role}.`);
  }
  return account;
}

export function requireScope(viewer: Viewer, scope: ApiScope): Account {
  const account = requireAccount(viewer);
  if (!hasScope(account, scope)) {
    throw forbidden(
      `This token does not have the scope ${scope}. Make a token with it on your account page.`,
    );
  }
  return account;
}
