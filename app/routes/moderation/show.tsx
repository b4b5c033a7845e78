import { redirect } from "react-router";
import type { TitleBlockEntry } from "@/app/components/layout/title-block";
import { ReviewPage } from "@/app/components/moderation/review-page";
import { drawSubmission } from "@/app/components/submission/draw-submission.server";
import { requireRole } from "@/app/features/accounts/viewer-policy";
import { decisionBody } from "@/app/features/moderation/decision-form";
import { listQueue } from "@/app/features/moderation/list-queue.server";
import { listSubmission } from "@/app/features/moderation/list-submission.server";
import { returnSubmission } from "@/app/features/moderation/return-submission.server";
import { getSubmission } from "@/app/features/submissions/get-submission.server";
import { answerForm, answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/show";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `S-${loaderData.submission.number}, review` : "Review"} · Backsight` },
];

export const handle = {
  titleBlock: ({ submission }: Route.ComponentProps["loaderData"]): TitleBlockEntry => ({
    label: "In review",
    value: `S-${submission.number}`,
  }),
};

export async function loader({ request, params, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const viewer = context.get(viewerContext);
    requireRole(viewer, "admin");
    const [submission, queue] = await Promise.all([getSubmission(viewer, params.id), listQueue(viewer)]);
    return {
      submission,
      drawings: await drawSubmission(submission),
      neighbours: neighboursOf(queue, params.id),
    };
  });
}

/** The submissions before and after this one in the queue. */
function neighboursOf(queue: { id: string }[], id: string) {
  const at = queue.findIndex((item) => item.id === id);
  return { previous: queue[at - 1]?.id ?? null, next: queue[at + 1]?.id ?? null };
}

/** Both decisions post here, the one that lists to `?list`. */
export async function action({ request, params, context }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  const isListing = new URL(request.url).searchParams.has("list");
  return answerForm(request, decisionBody, async ({ note }) => {
    const decide = isListing ? listSubmission : returnSubmission;
    await decide(viewer, { id: params.id, note });
    return redirect(`/moderation?decided=${params.id}`);
  });
}

export default function Review({ loaderData, actionData }: Route.ComponentProps) {
  return <ReviewPage {...loaderData} refusal={actionData} />;
}
