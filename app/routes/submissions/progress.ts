import { watchSubmission } from "@/app/features/submissions/watch-submission.server";
import { answerApi } from "@/app/http/answers.server";
import { answerEvents } from "@/app/http/event-stream.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/progress";

export const loader = ({ request, params, context }: Route.LoaderArgs) =>
  answerApi(async () => {
    const follow = await watchSubmission(context.get(viewerContext), params.id);
    return answerEvents("progress", request.signal, follow);
  });
