import { getRecord } from "@/app/features/submissions/get-submission.server";
import { answerApi } from "@/app/http/answers.server";
import { answerRead } from "@/app/http/public-read.server";
import { viewerContext } from "@/app/http/session.server";
import { toRecordJson } from "@/app/http/submission-json";
import type { Route } from "./+types/record";

export const loader = ({ request, params, context }: Route.LoaderArgs) =>
  answerApi(async () => {
    const viewer = context.get(viewerContext);
    const record = await getRecord(viewer, Number(params.number), Number(params.version));
    return answerRead(request, toRecordJson(record), { isPrivate: viewer !== null });
  });
