import { redirect } from "react-router";
import { z } from "zod";
import type { TitleBlockEntry } from "@/app/components/layout/title-block";
import { drawSubmission } from "@/app/components/submission/draw-submission.server";
import { SubmissionPage } from "@/app/components/submission/submission-page";
import { WithdrawPage } from "@/app/components/submission/withdraw-page";
import { decisionBody } from "@/app/features/moderation/decision-form";
import { getSubmission } from "@/app/features/submissions/get-submission.server";
import { handInSubmission } from "@/app/features/submissions/hand-in-submission.server";
import { withdrawSubmission } from "@/app/features/submissions/withdraw-submission.server";
import { answerForm, answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/show";

export const meta: Route.MetaFunction = ({ loaderData }) => {
  const view = loaderData?.submission;
  return [{ title: view ? `S-${view.number}, ${view.solver.name} · Backsight` : "Submission · Backsight" }];
};

export const handle = {
  titleBlock: ({ submission }: Route.ComponentProps["loaderData"]): TitleBlockEntry => ({
    label: "Submission",
    value: `S-${submission.number}, not listed`,
  }),
};

/** What is listed has its permanent address; only its withdrawal is asked for here. */
export async function loader({ request, params, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const submission = await getSubmission(context.get(viewerContext), params.id);
    const isWithdrawing = isAskedToWithdraw(request) && submission.permissions.canWithdraw;
    if (submission.record && !isWithdrawing) {
      throw redirect(`/records/${submission.record.number}/${submission.record.version}`);
    }
    return { submission, isWithdrawing, drawings: await drawSubmission(submission) };
  });
}

/** Two forms post here: hand in, and, to `?withdraw`, the note with which a record is withdrawn. */
export async function action({ request, params, context }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  if (isAskedToWithdraw(request)) {
    return answerForm(request, decisionBody, async ({ note }) => {
      await withdrawSubmission(viewer, { id: params.id, note });
      return redirect(`/submissions/${params.id}`);
    });
  }
  return answerForm(request, z.object({}), async () => {
    await handInSubmission(viewer, params.id);
    return redirect(`/submissions/${params.id}`);
  });
}

function isAskedToWithdraw(request: Request): boolean {
  return new URL(request.url).searchParams.has("withdraw");
}

export default function Submission({ loaderData, actionData }: Route.ComponentProps) {
  const { submission, isWithdrawing, drawings } = loaderData;
  if (isWithdrawing) return <WithdrawPage submission={submission} refusal={actionData} />;
  return <SubmissionPage submission={submission} drawings={drawings} refusal={actionData} />;
}
