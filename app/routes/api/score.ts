import { scoreFiles } from "@/app/features/scoring/score-files.server";
import { answerApi } from "@/app/http/answers.server";
import { toScoreJson } from "@/app/http/score-json";
import { withFilesInMemory } from "@/app/http/upload.server";
import type { Route } from "./+types/score";

export const action = ({ request }: Route.ActionArgs) =>
  answerApi(async () => {
    const answer = await withFilesInMemory(request, scoreFiles);
    return Response.json(toScoreJson(answer), { headers: { "Cache-Control": "no-store" } });
  });
