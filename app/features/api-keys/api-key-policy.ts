import type { ApiScope, Role } from "@/drizzle/enums";
import { apiScopes } from "@/drizzle/enums";
import type { Account } from "../accounts/viewer";
import { hasRole, hasScope } from "../accounts/viewer-policy";

const roleOfScope: Record<ApiScope, Role> = {
  read: "author",
  submit: "author",
  curate: "maintainer",
  review: "admin",
};

/** What the account may give to a new token: no more than its role allows, nor than the token it acts through. */
export function grantableScopes(account: Account): ApiScope[] {
  return apiScopes.filter((scope) => hasRole(account, roleOfScope[scope]) && hasScope(account, scope));
}
