import { data } from "react-router";
import { drawChart } from "@/app/components/charts/draw-chart.server";
import { Instrument } from "@/app/components/instrument/instrument";
import { chartOfRanking } from "@/app/components/instrument/ranking-chart";
import { normCell } from "@/app/components/instrument/ranking-words";
import { HandInGuide } from "@/app/components/problem/hand-in-guide";
import { ProblemDefinitionSheet } from "@/app/components/problem/problem-definition-sheet";
import { RevisionLedger } from "@/app/components/problem/revision-ledger";
import { typesetProblemPage } from "@/app/components/problem/typeset-problem.server";
import { ButtonLink } from "@/app/components/ui/button";
import { getProblem } from "@/app/features/problems/get-problem.server";
import { rankProblem } from "@/app/features/rankings/rank-problem.server";
import { readRankingView } from "@/app/features/rankings/ranking-view";
import { answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";
import type { Route } from "./+types/show";

export async function loader({ request, params, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const { searchParams } = new URL(request.url);
    const revision = Number(searchParams.get("revision")) || null;
    const view = readRankingView(searchParams);
    const [problem, ranking] = await Promise.all([
      getProblem(params.slug, revision),
      rankProblem(context.get(viewerContext), params.slug, view.query),
    ]);
    const { isSteady } = problem.definition.classification;
    const outputTime = isSteady ? null : Math.max(...problem.definition.outputTimes);
    const drawings = await drawChart(chartOfRanking(ranking, outputTime), "instrument");
    const page = { page: typesetProblemPage(problem), ranking, view, drawings, outputTime };
    return data(page, { status: Object.keys(view.errors).length > 0 ? 422 : 200 });
  });
}

export const meta: Route.MetaFunction = ({ loaderData }) =>
  loaderData
    ? [
        { title: `${loaderData.page.code} ${loaderData.page.title} · Backsight` },
        { name: "description", content: loaderData.page.definition.statement },
      ]
    : [];

type LoaderData = Route.ComponentProps["loaderData"];

export const handle = {
  titleBlock: ({ page, ranking }: LoaderData) => ({
    label: "Test problem",
    value: `${page.code}, revision ${page.revision}`,
    norm: normCell(ranking.norm, ranking.measure),
  }),
};

export default function ProblemShow({ loaderData }: Route.ComponentProps) {
  const { page, ranking, view, drawings, outputTime } = loaderData;
  const records = ranking.total + ranking.notReached.length;
  return (
    <>
      <p className="crumb">
        <a href="/problems">Test problems</a>, {page.definition.classification.domain} domains
      </p>
      <div id="definition">
        <ProblemDefinitionSheet page={page} records={records} />
      </div>
      <nav className="secnav" aria-label="On this page">
        <a href="#definition">Definition</a>
        <a href="#accuracy" aria-current="true">
          Accuracy
        </a>
        <a href="#handing-in">Handing in</a>
        <a href="#revisions">Revisions</a>
        <span className="sp small quiet">
          {records === 1 ? "1 record" : `${records} records`}, scorer {scorerVersion}
        </span>
      </nav>
      <div id="accuracy" className="pt-6">
        <Instrument
          ranking={ranking}
          view={view}
          drawings={drawings}
          outputTime={outputTime}
          gridKinds={[...new Set(page.definition.grids.kinds.flat())]}
        />
        <div className="flex flex-wrap items-center gap-5 pt-5">
          <ButtonLink variant="primary" href={`/submit?problem=${page.slug}`}>
            Hand in a refinement study
          </ButtonLink>
          <p className="small quiet max-w-[62ch]">
            The server computes every figure from your files; a record is listed after review.
          </p>
        </div>
      </div>
      <HandInGuide problem={page.definition} />
      <RevisionLedger slug={page.slug} revisions={page.revisions} />
    </>
  );
}
