import { listProblems } from "@/app/features/problems/list-problems.server";
import { answerApi } from "@/app/http/answers.server";
import { toProblemsCsv, toProblemSummaryJson } from "@/app/http/problem-json";
import { answerRead } from "@/app/http/public-read.server";
import type { Route } from "./+types/problems";

export const loader = ({ request }: Route.LoaderArgs) =>
  answerApi(async () => {
    const problems = await listProblems();
    const answer = { items: problems.map(toProblemSummaryJson), nextCursor: null };
    return answerRead(request, answer, { csv: () => toProblemsCsv(problems) });
  });
