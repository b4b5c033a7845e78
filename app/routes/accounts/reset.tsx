import { Link, redirect } from "react-router";
import { AccountForm } from "@/app/components/accounts/account-form";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { FormField } from "@/app/components/accounts/form-field";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { resetForm } from "@/app/features/accounts/account-form";
import { isLinkUsable } from "@/app/features/accounts/one-use-links.server";
import { passwordLength } from "@/app/features/accounts/password-rules";
import { resetPassword } from "@/app/features/accounts/reset-password.server";
import { answerForm } from "@/app/http/answers.server";
import { forgetSession } from "@/app/http/session.server";
import type { Route } from "./+types/reset";

export const meta: Route.MetaFunction = () => [{ title: "Set a new password · Backsight" }];

export async function loader({ params }: Route.LoaderArgs) {
  return { isUsable: await isLinkUsable(params.token, "resetPassword") };
}

export async function action({ request, params }: Route.ActionArgs) {
  return answerForm(request, resetForm, async ({ password }) => {
    await resetPassword(params.token, password);
    return redirect("/sign-in?done=reset", { headers: await forgetSession() });
  });
}

export default function Reset({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <AccountSheet title="Set a new password" notes={["Every session of the account ends, in every browser."]}>
      {loaderData.isUsable ? (
        <AccountForm refusal={actionData}>
          <FormField
            name="password"
            label="New password"
            type="password"
            autoComplete="new-password"
            hint={`At least ${passwordLength.min} characters. A sentence of some words is easy to keep.`}
            refusal={actionData}
          />
          <Button type="submit" variant="primary">
            Set the password
          </Button>
        </AccountForm>
      ) : (
        <Notice tone="bad">
          This link has been used or is older than an hour. <Link to="/forgot">Ask for a new one</Link>.
        </Notice>
      )}
    </AccountSheet>
  );
}
