import { decisionBody } from "@/app/features/moderation/decision-form";
import { listSubmission } from "@/app/features/moderation/list-submission.server";
import { answerApi } from "@/app/http/answers.server";
import { readJson } from "@/app/http/read-json.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/list-submission";

export const action = ({ request, params, context }: Route.ActionArgs) =>
  answerApi(async () => {
    const { note } = await readJson(request, decisionBody);
    const { id, record } = await listSubmission(context.get(viewerContext), { id: params.id, note });
    return Response.json({ id, state: "listed", record });
  });
