import { redirect, useSearchParams } from "react-router";
import { AccountNav } from "@/app/components/accounts/account-nav";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { ApiKeyForm } from "@/app/components/accounts/api-key-form";
import { ApiKeysLedger } from "@/app/components/accounts/api-keys-ledger";
import { NewSecret } from "@/app/components/accounts/new-secret";
import { Notice } from "@/app/components/ui/notice";
import { requireAccount } from "@/app/features/accounts/viewer-policy";
import { apiKeyForm, revokeForm } from "@/app/features/api-keys/api-key-form";
import { grantableScopes } from "@/app/features/api-keys/api-key-policy";
import { createApiKey } from "@/app/features/api-keys/create-api-key.server";
import { listApiKeys } from "@/app/features/api-keys/list-api-keys.server";
import { revokeApiKey } from "@/app/features/api-keys/revoke-api-key.server";
import { answerForm, answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/tokens";

export const meta: Route.MetaFunction = () => [{ title: "API tokens · Backsight" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const account = requireAccount(context.get(viewerContext));
    return { keys: await listApiKeys(account), scopes: grantableScopes(account) };
  });
}

/** Two forms post here: the one that makes a token, and, to `?revoke`, the one beside each token. */
export async function action({ request, context }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  if (new URL(request.url).searchParams.has("revoke")) {
    return answerForm(request, revokeForm, async ({ id }) => {
      await revokeApiKey(viewer, id);
      return redirect("/account/tokens?revoked");
    });
  }
  return answerForm(request, apiKeyForm, async (input) => {
    const { secret } = await createApiKey(viewer, input);
    return { name: input.name, secret };
  });
}

export default function Tokens({ loaderData, actionData }: Route.ComponentProps) {
  const [search] = useSearchParams();
  const refusal = actionData && "fields" in actionData ? actionData : undefined;
  const created = actionData && "secret" in actionData ? actionData : undefined;
  return (
    <AccountSheet
      title="API tokens"
      nav={<AccountNav />}
      notes={[
        "A token acts for you within its scopes. Keep it as you keep a password.",
        "It is sent as Authorization: Bearer, from a CI job for example.",
      ]}
    >
      {created ? <NewSecret name={created.name} secret={created.secret} /> : null}
      {search.has("revoked") && !actionData ? (
        <Notice tone="ok">The token is revoked. Calls with it are refused.</Notice>
      ) : null}
      <section aria-labelledby="tokens">
        <h2 id="tokens">Your tokens</h2>
        <ApiKeysLedger keys={loaderData.keys} />
      </section>
      <section aria-labelledby="new-token">
        <h2 id="new-token">Make a token</h2>
        {/* Another key empties the fields once a token is made. */}
        <ApiKeyForm key={created?.secret ?? "form"} scopes={loaderData.scopes} refusal={refusal} />
      </section>
    </AccountSheet>
  );
}
