import type { TitleBlockEntry } from "@/app/components/layout/title-block";
import { ModerationPage } from "@/app/components/moderation/moderation-page";
import { listModeration } from "@/app/features/moderation/list-moderation.server";
import { parseModerationQuery } from "@/app/features/moderation/moderation-query";
import { answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Review of submissions · Backsight" }];

export const handle = {
  titleBlock: ({ list }: Route.ComponentProps["loaderData"]): TitleBlockEntry => ({
    label: "Waiting",
    value: `${list.counts.waiting} submission${list.counts.waiting === 1 ? "" : "s"}`,
  }),
};

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const query = parseModerationQuery(new URL(request.url).searchParams);
    const list = await listModeration(context.get(viewerContext), query);
    // The same waiting time on the server and in the browser.
    return { query, list, now: Date.now() };
  });
}

export default function Moderation({ loaderData }: Route.ComponentProps) {
  return <ModerationPage {...loaderData} />;
}
