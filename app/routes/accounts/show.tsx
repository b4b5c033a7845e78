import { Form, Link } from "react-router";
import { z } from "zod";
import { AccountNav } from "@/app/components/accounts/account-nav";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { SessionsLedger } from "@/app/components/accounts/sessions-ledger";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { StateMark } from "@/app/components/ui/state-mark";
import { resendVerification } from "@/app/features/accounts/resend-verification.server";
import { endOtherSessions, listMySessions } from "@/app/features/accounts/sessions.server";
import { requireAccount } from "@/app/features/accounts/viewer-policy";
import { answerForm, answerPage } from "@/app/http/answers.server";
import { sessionSecretOf, viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/show";

export const meta: Route.MetaFunction = () => [{ title: "Account · Backsight" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const account = requireAccount(context.get(viewerContext));
    const sessions = await listMySessions(account, (await sessionSecretOf(request)) ?? "");
    const { name, email, role, isEmailVerified, teams } = account;
    return { account: { name, email, role, isEmailVerified, teams }, sessions };
  });
}

const accountAction = z.object({ intent: z.enum(["resend", "endOthers"]) });

export async function action({ request, context }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  return answerForm(request, accountAction, async ({ intent }) => {
    if (intent === "resend") {
      await resendVerification(viewer);
      return { done: "A new link is on its way. It works once, for an hour." };
    }
    const ended = await endOtherSessions(viewer, (await sessionSecretOf(request)) ?? "");
    return { done: ended === 1 ? "One other session was ended." : `${ended} other sessions were ended.` };
  });
}

export default function AccountPage({ loaderData, actionData }: Route.ComponentProps) {
  const { account, sessions } = loaderData;
  return (
    <AccountSheet
      title="Account"
      nav={<AccountNav />}
      notes={["A session ends 12 hours after its sign-in, or when the password is set anew."]}
    >
      {actionData && "done" in actionData ? <Notice tone="ok">{actionData.done}</Notice> : null}
      {actionData && "message" in actionData && actionData.message ? (
        <Notice tone="bad">{actionData.message}</Notice>
      ) : null}
      <section aria-labelledby="profile">
        <h2 id="profile">Profile</h2>
        <dl className="facts wide">
          <Fact label="Name">{account.name}</Fact>
          <Fact label="E-mail">{account.email}</Fact>
          <Fact label="Address">
            {account.isEmailVerified ? (
              <StateMark state="listed">verified</StateMark>
            ) : (
              <StateMark state="finding">not verified</StateMark>
            )}
          </Fact>
          <Fact label="Role">{account.role}</Fact>
          <Fact label="Teams">
            {account.teams.length > 0 ? account.teams.map((team) => team.name).join(", ") : "none yet"}
          </Fact>
        </dl>
        {account.isEmailVerified ? null : (
          <Form method="post">
            <p>
              Handing in needs a verified address. Follow the link in the mail, or have a new one sent to{" "}
              {account.email}.
            </p>
            <Button type="submit" name="intent" value="resend">
              Send a new link
            </Button>
          </Form>
        )}
        <p>
          To change the password, <Link to="/forgot">have a link sent</Link>.
        </p>
      </section>
      <section aria-labelledby="sessions">
        <h2 id="sessions">Sessions</h2>
        <SessionsLedger sessions={sessions} />
        {sessions.length > 1 ? (
          <Form method="post">
            <Button type="submit" name="intent" value="endOthers">
              End all other sessions
            </Button>
          </Form>
        ) : null}
      </section>
    </AccountSheet>
  );
}

function Fact({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <div>
      <dt>{label}</dt>
      <dd>{children}</dd>
    </div>
  );
}
