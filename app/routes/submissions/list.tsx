import type { TitleBlockEntry } from "@/app/components/layout/title-block";
import { SubmissionsLedger } from "@/app/components/submission/submissions-ledger";
import { requireAccount } from "@/app/features/accounts/viewer-policy";
import { listMySubmissions } from "@/app/features/submissions/list-submissions.server";
import { answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Submissions · Backsight" }];

export const handle = {
  titleBlock: (): TitleBlockEntry => ({ label: "Sheet", value: "Submissions of your teams" }),
};

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const account = requireAccount(context.get(viewerContext));
    return { submissions: await listMySubmissions(account), teams: account.teams.length };
  });
}

export default function Submissions({ loaderData }: Route.ComponentProps) {
  return <SubmissionsLedger submissions={loaderData.submissions} hasTeam={loaderData.teams > 0} />;
}
