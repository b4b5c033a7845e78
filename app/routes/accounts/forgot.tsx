import { Link, redirect, useSearchParams } from "react-router";
import { AccountForm } from "@/app/components/accounts/account-form";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { FormField } from "@/app/components/accounts/form-field";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { forgotForm } from "@/app/features/accounts/account-form";
import { requestReset } from "@/app/features/accounts/reset-password.server";
import { answerForm } from "@/app/http/answers.server";
import { clientAddressOf } from "@/app/http/client-address.server";
import type { Route } from "./+types/forgot";

export const meta: Route.MetaFunction = () => [{ title: "Forgotten password · Backsight" }];

export async function action({ request }: Route.ActionArgs) {
  return answerForm(request, forgotForm, async ({ email }) => {
    await requestReset(email, clientAddressOf(request));
    return redirect("/forgot?sent=yes");
  });
}

export default function Forgot({ actionData }: Route.ComponentProps) {
  const [search] = useSearchParams();
  return (
    <AccountSheet title="Forgotten password" notes={["The link in the mail works once, for an hour."]}>
      {search.has("sent") ? (
        <Notice tone="ok">
          A mail is on its way to the address that you gave. It says how to set a new password, or that no
          account uses the address.
        </Notice>
      ) : (
        <AccountForm refusal={actionData}>
          <FormField
            name="email"
            label="E-mail"
            type="email"
            autoComplete="username"
            hint="A link to set a new password is sent to this address."
            refusal={actionData}
          />
          <Button type="submit" variant="primary">
            Send the link
          </Button>
          <p className="pt-2 text-14">
            <Link to="/sign-in">Back to sign in</Link>
          </p>
        </AccountForm>
      )}
    </AccountSheet>
  );
}
