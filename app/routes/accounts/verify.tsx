import { Link, redirect } from "react-router";
import { z } from "zod";
import { AccountForm } from "@/app/components/accounts/account-form";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { isLinkUsable } from "@/app/features/accounts/one-use-links.server";
import { verifyEmail } from "@/app/features/accounts/verify-email.server";
import { answerForm } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/verify";

export const meta: Route.MetaFunction = () => [{ title: "Verify your address · Backsight" }];

export async function loader({ params }: Route.LoaderArgs) {
  return { isUsable: await isLinkUsable(params.token, "verifyEmail") };
}

// Opening the link uses nothing up: mail programs open links to look at them.
export async function action({ request, params, context }: Route.ActionArgs) {
  return answerForm(request, z.object({}), async () => {
    await verifyEmail(params.token);
    return redirect(context.get(viewerContext) === null ? "/sign-in?done=verified" : "/account");
  });
}

export default function Verify({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <AccountSheet title="Verify your address" notes={["A verified address is needed to hand in."]}>
      {loaderData.isUsable ? (
        <AccountForm refusal={actionData}>
          <p className="pb-4">The link is right. One more step verifies that this e-mail address is yours.</p>
          <Button type="submit" variant="primary">
            Verify the address
          </Button>
        </AccountForm>
      ) : (
        <Notice tone="bad">
          This link has been used or is older than an hour. Ask for a new one on{" "}
          <Link to="/account">your account page</Link>.
        </Notice>
      )}
    </AccountSheet>
  );
}
