import { Link, redirect, useSearchParams } from "react-router";
import { AccountForm } from "@/app/components/accounts/account-form";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { FormField } from "@/app/components/accounts/form-field";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { joinForm } from "@/app/features/accounts/account-form";
import { joinAccount } from "@/app/features/accounts/join-account.server";
import { passwordLength } from "@/app/features/accounts/password-rules";
import { answerForm } from "@/app/http/answers.server";
import { clientAddressOf } from "@/app/http/client-address.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/join";

export const meta: Route.MetaFunction = () => [{ title: "Make an account · Backsight" }];

export function loader({ context }: Route.LoaderArgs) {
  if (context.get(viewerContext) !== null) throw redirect("/account");
  return null;
}

export async function action({ request }: Route.ActionArgs) {
  return answerForm(request, joinForm, async (input) => {
    await joinAccount({ ...input, address: clientAddressOf(request) });
    return redirect("/join?sent=yes");
  });
}

export default function Join({ actionData }: Route.ComponentProps) {
  const [search] = useSearchParams();
  return (
    <AccountSheet
      title="Make an account"
      notes={[
        "Records show the team's name. Your own name is shown to your team and to reviewers; your address to nobody.",
        "Handing in needs a verified address: the mail holds a link that works once, for an hour.",
      ]}
    >
      {search.has("sent") ? (
        <Notice tone="ok">
          A mail is on its way to the address that you gave. Follow its link within an hour, then{" "}
          <Link to="/sign-in">sign in</Link>.
        </Notice>
      ) : (
        <AccountForm refusal={actionData}>
          <FormField name="name" label="Name" autoComplete="name" refusal={actionData} />
          <FormField name="email" label="E-mail" type="email" autoComplete="username" refusal={actionData} />
          <FormField
            name="password"
            label="Password"
            type="password"
            autoComplete="new-password"
            hint={`At least ${passwordLength.min} characters. A sentence of some words is easy to keep.`}
            refusal={actionData}
          />
          <Button type="submit" variant="primary">
            Make the account
          </Button>
          <p className="pt-2 text-14">
            <Link to="/sign-in">Sign in instead</Link>
          </p>
        </AccountForm>
      )}
    </AccountSheet>
  );
}
