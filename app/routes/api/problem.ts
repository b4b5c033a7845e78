import { getProblem } from "@/app/features/problems/get-problem.server";
import { answerApi } from "@/app/http/answers.server";
import { toProblemJson } from "@/app/http/problem-json";
import { answerRead } from "@/app/http/public-read.server";
import type { Route } from "./+types/problem";

export const loader = ({ request, params }: Route.LoaderArgs) =>
  answerApi(async () => answerRead(request, toProblemJson(await getProblem(params.slug))));
