import { Link, redirect, useSearchParams } from "react-router";
import { AccountForm } from "@/app/components/accounts/account-form";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { FormField } from "@/app/components/accounts/form-field";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { signInForm } from "@/app/features/accounts/account-form";
import { answerForm } from "@/app/http/answers.server";
import { nextPath } from "@/app/http/next-path.server";
import { authenticate, signIn, viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/sign-in";

export const meta: Route.MetaFunction = () => [{ title: "Sign in · Backsight" }];

const goal = (request: Request) => nextPath(new URL(request.url).searchParams.get("next"));

export function loader({ request, context }: Route.LoaderArgs) {
  if (context.get(viewerContext) !== null) throw redirect(goal(request));
  return null;
}

export async function action({ request }: Route.ActionArgs) {
  return answerForm(request, signInForm, async () => {
    const { userId } = await authenticate(request);
    return redirect(goal(request), { headers: await signIn(request, userId) });
  });
}

const news: Record<string, string> = {
  verified: "Your e-mail address is verified. Sign in to go on.",
  reset: "The new password is set, and every session has ended. Sign in with it.",
};

export default function SignIn({ actionData }: Route.ComponentProps) {
  const [search] = useSearchParams();
  const done = news[search.get("done") ?? ""];
  return (
    <AccountSheet
      title="Sign in"
      notes={[
        "Reading, comparing, checking and planning need no account.",
        "An account is for handing in, keeping test problems and review.",
      ]}
    >
      {done ? <Notice tone="ok">{done}</Notice> : null}
      <AccountForm refusal={actionData}>
        <FormField name="email" label="E-mail" type="email" autoComplete="username" refusal={actionData} />
        <FormField
          name="password"
          label="Password"
          type="password"
          autoComplete="current-password"
          refusal={actionData}
        />
        <Button type="submit" variant="primary">
          Sign in
        </Button>
        <p className="flex items-baseline justify-between gap-4 pt-2 text-14">
          <Link to="/join">Make an account</Link>
          <Link to="/forgot">Forgotten password</Link>
        </p>
      </AccountForm>
    </AccountSheet>
  );
}
