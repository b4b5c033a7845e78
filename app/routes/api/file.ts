import { answerApi } from "@/app/http/answers.server";
import { answerFile } from "@/app/http/file-answer.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/file";

export const loader = ({ request, params, context }: Route.LoaderArgs) =>
  answerApi(() =>
    answerFile({
      request,
      viewer: context.get(viewerContext),
      runId: params.runId,
      submissionId: params.id,
    }),
  );
