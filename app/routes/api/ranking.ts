import { rankProblem } from "@/app/features/rankings/rank-problem.server";
import { parseRankingQuery } from "@/app/features/rankings/ranking-query";
import { answerApi } from "@/app/http/answers.server";
import { answerRead } from "@/app/http/public-read.server";
import { toRankingCsv, toRankingJson } from "@/app/http/ranking-json";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/ranking";

export const loader = ({ request, params, context }: Route.LoaderArgs) =>
  answerApi(async () => {
    const query = parseRankingQuery(new URL(request.url).searchParams);
    const ranking = await rankProblem(context.get(viewerContext), params.slug, query, { withCurves: false });
    return answerRead(request, toRankingJson(ranking), { csv: () => toRankingCsv(ranking) });
  });
