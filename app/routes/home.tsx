import { data } from "react-router";
import { drawChart } from "@/app/components/charts/draw-chart.server";
import { Instrument } from "@/app/components/instrument/instrument";
import { chartOfRanking } from "@/app/components/instrument/ranking-chart";
import { normCell } from "@/app/components/instrument/ranking-words";
import { Formula } from "@/app/components/problem/formula";
import { ProblemLedger } from "@/app/components/problem/problem-ledger";
import { typesetMath } from "@/app/components/problem/typeset-math.server";
import { ListedLately } from "@/app/components/record/listed-lately";
import { getProblem } from "@/app/features/problems/get-problem.server";
import { listProblems } from "@/app/features/problems/list-problems.server";
import { rankProblem } from "@/app/features/rankings/rank-problem.server";
import { readRankingView } from "@/app/features/rankings/ranking-view";
import { listRecords } from "@/app/features/submissions/list-submissions.server";
import { answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/home";

const featuredSlug = "advection-exp-sine";

export const meta: Route.MetaFunction = () => [
  { title: "Backsight: how close each solver comes to a known exact solution" },
  {
    name: "description",
    content: "A shared register of solver accuracy on test problems with exact solutions.",
  },
];

type LoaderData = Route.ComponentProps["loaderData"];

export const handle = {
  titleBlock: ({ featured }: LoaderData) => ({
    label: "Sheet",
    value: "All test problems",
    norm: featured ? normCell(featured.ranking.norm, featured.ranking.measure) : undefined,
  }),
};

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const [summaries, lately] = await Promise.all([listProblems(), listRecords({ limit: 6 })]);
    const problems = summaries.map((problem) => ({
      ...problem,
      equation: typesetMath(problem.equationsLatex),
    }));
    // Before the shipped problems are published there is nothing to feature.
    const slug = problems.find((problem) => problem.slug === featuredSlug)?.slug ?? problems.at(0)?.slug;
    const view = readRankingView(new URL(request.url).searchParams);
    const featured = slug ? await feature(slug) : null;
    return data(
      { problems, lately: lately.items, view, featured },
      { status: Object.keys(view.errors).length > 0 ? 422 : 200 },
    );

    async function feature(slug: string) {
      const [problem, ranking] = await Promise.all([
        getProblem(slug),
        rankProblem(context.get(viewerContext), slug, view.query),
      ]);
      const { classification, outputTimes, grids } = problem.definition;
      const outputTime = classification.isSteady ? null : Math.max(...outputTimes);
      const drawings = await drawChart(chartOfRanking(ranking, outputTime), "instrument");
      return { ranking, drawings, outputTime, gridKinds: [...new Set(grids.kinds.flat())] };
    }
  });
}

export default function Home({ loaderData }: Route.ComponentProps) {
  const { problems, lately, view, featured } = loaderData;
  const of = (domain: string) => problems.filter((problem) => problem.classification.domain === domain);
  const shown = problems.find((problem) => problem.slug === featured?.ranking.problem.slug);
  return (
    <>
      <div className="lede">
        <h1>
          How close each solver comes to a known exact solution, and how many nodes it takes to get there.
        </h1>
        <div className="count">
          <span>
            <b>{problems.length}</b>
            test problems
          </span>
          <span>
            <b>{problems.reduce((sum, problem) => sum + problem.records, 0)}</b>
            records
          </span>
        </div>
      </div>
      {featured && shown ? (
        <>
          <div className="feat">
            <span className="fig">{shown.code}</span>
            <h2>
              <a href={`/problems/${shown.slug}`}>{shown.title}</a>
            </h2>
            <span className="eq">
              <Formula markup={shown.equation} />
            </span>
            <span className="r">
              <a href={`/problems/${shown.slug}`}>Definition, grids and revisions</a>
            </span>
          </div>
          <Instrument view={view} {...featured} />
        </>
      ) : null}
      <ProblemLedger
        id="periodic"
        title="Periodic domains"
        remark="one period, equally spaced nodes"
        problems={of("periodic")}
      />
      <ProblemLedger
        id="bounded"
        title="Bounded domains"
        remark="Dirichlet, Neumann and Robin conditions"
        problems={of("bounded")}
      />
      <ListedLately records={lately} />
    </>
  );
}
