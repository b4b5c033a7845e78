import { redirect, useSearchParams } from "react-router";
import { AccountForm } from "@/app/components/accounts/account-form";
import { AccountNav } from "@/app/components/accounts/account-nav";
import { AccountSheet } from "@/app/components/accounts/account-sheet";
import { FormField } from "@/app/components/accounts/form-field";
import { TeamsLedger } from "@/app/components/accounts/teams-ledger";
import { Button } from "@/app/components/ui/button";
import { Notice } from "@/app/components/ui/notice";
import { requireAccount } from "@/app/features/accounts/viewer-policy";
import { createTeam } from "@/app/features/teams/create-team.server";
import { listMyTeams } from "@/app/features/teams/list-teams.server";
import { teamForm } from "@/app/features/teams/team-form";
import { answerForm, answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/teams";

export const meta: Route.MetaFunction = () => [{ title: "Teams · Backsight" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const account = requireAccount(context.get(viewerContext));
    return { teams: await listMyTeams(account), isEmailVerified: account.isEmailVerified };
  });
}

export async function action({ request, context }: Route.ActionArgs) {
  return answerForm(request, teamForm, async (input) => {
    const { slug } = await createTeam(context.get(viewerContext), input);
    return redirect(`/account/teams?created=${slug}`);
  });
}

export default function Teams({ loaderData, actionData }: Route.ComponentProps) {
  const [search] = useSearchParams();
  const created = loaderData.teams.find((team) => team.slug === search.get("created"));
  return (
    <AccountSheet
      title="Teams"
      nav={<AccountNav />}
      notes={[
        "Submissions belong to a team, and its name stands on the record.",
        "Until a submission is listed, only its team and the reviewers see it.",
      ]}
    >
      {created ? <Notice tone="ok">The team {created.name} is made. You can hand in for it.</Notice> : null}
      <section aria-labelledby="teams">
        <h2 id="teams">Your teams</h2>
        <TeamsLedger teams={loaderData.teams} />
      </section>
      <section aria-labelledby="new-team">
        <h2 id="new-team">Make a team</h2>
        {loaderData.isEmailVerified ? (
          <AccountForm refusal={actionData}>
            <FormField
              name="name"
              label="Name"
              autoComplete="organization"
              hint="Its address is made from the name and does not change."
              refusal={actionData}
            />
            <Button type="submit" variant="primary">
              Make the team
            </Button>
          </AccountForm>
        ) : (
          <p>
            A team needs a verified address. Follow the link in the mail, or ask for a new one under Profile.
          </p>
        )}
      </section>
    </AccountSheet>
  );
}
