import { handInSubmission } from "@/app/features/submissions/hand-in-submission.server";
import { answerApi } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/hand-in";

export const action = ({ params, context }: Route.ActionArgs) =>
  answerApi(async () => {
    const { id, state } = await handInSubmission(context.get(viewerContext), params.id);
    return Response.json({ id, state });
  });
