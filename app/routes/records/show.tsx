import type { ReactNode } from "react";
import { Chart } from "@/app/components/charts/chart";
import { drawChart } from "@/app/components/charts/draw-chart.server";
import { recordHref } from "@/app/components/instrument/ranking-words";
import { Sheet } from "@/app/components/layout/sheet";
import { CiteBlock } from "@/app/components/record/cite-block";
import { EvidenceLedger } from "@/app/components/record/evidence-ledger";
import { EvidenceSummary } from "@/app/components/record/evidence-summary";
import { FindingsList } from "@/app/components/record/findings-list";
import { GridConvergenceTable } from "@/app/components/record/grid-convergence-table";
import { chartOfStudies } from "@/app/components/record/record-chart";
import { RecordFacts } from "@/app/components/record/record-facts";
import { RecordHistory } from "@/app/components/record/record-history";
import { RecordNotices } from "@/app/components/record/record-notices";
import { StudyLedger } from "@/app/components/record/study-ledger";
import { ToleranceReadings } from "@/app/components/record/tolerance-readings";
import { VerdictPlate } from "@/app/components/record/verdict-plate";
import { CopyButton } from "@/app/components/ui/copy-button";
import { formatRecordNumber } from "@/app/components/ui/figures";
import { getRecord } from "@/app/features/submissions/get-submission.server";
import { answerPage } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import type { Route } from "./+types/show";

export async function loader({ request, params, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const viewer = context.get(viewerContext);
    const view = await getRecord(viewer, Number(params.number), Number(params.version));
    const { searchParams, origin } = new URL(request.url);
    const given = Number(searchParams.get("tolerance"));
    const carried = given > 0 && given <= 1e3 ? given : null;
    const outputTime = view.runs.find((run) => run.score)?.score?.times.at(-1)?.t ?? null;
    const chart = chartOfStudies(view.studies, view.family, outputTime, carried);
    const address = origin + recordHref(view.record);
    return { view, carried, chart, drawings: await drawChart(chart, "record"), outputTime, address };
  });
}

export const meta: Route.MetaFunction = ({ loaderData }) => {
  if (!loaderData) return [];
  const { record, solver, problem } = loaderData.view;
  return [
    { title: `Record ${formatRecordNumber(record.number)}, ${solver.slug} on ${problem.code} · Backsight` },
  ];
};

type LoaderData = Route.ComponentProps["loaderData"];

export const handle = {
  titleBlock: ({ view: { record, problem } }: LoaderData) => ({
    label: "Record",
    value: `${formatRecordNumber(record.number)}, version ${record.version}, on ${problem.code} revision ${problem.revision}`,
  }),
};

export default function RecordShow({ loaderData }: Route.ComponentProps) {
  const { view, carried, chart, drawings, outputTime, address } = loaderData;
  const { problem } = view;
  return (
    <>
      <p className="crumb">
        <a href="/records">Records</a>,{" "}
        <a href={`/problems/${problem.slug}`}>
          {problem.code} {problem.title}
        </a>
      </p>
      <Sheet className="!pt-0" margin={<RecordFacts view={view} />}>
        <RecordNotices view={view} />
        <div className="ttl rec">
          <div>
            <h1>
              <code>{view.solver.slug}</code> on {problem.title}
            </h1>
            {view.version.description ? (
              <div className="prose">
                <p>{view.version.description}</p>
              </div>
            ) : null}
            {view.study ? <ToleranceReadings study={view.study} carried={carried} /> : null}
            <div className="mt-6 flex flex-wrap items-center gap-2.5">
              <CiteBlock view={view} />
              <a className="btn" href="#evidence">
                Download files
              </a>
              {view.permissions.canWithdraw ? (
                <a href={`/submissions/${view.id}?withdraw`}>Withdraw</a>
              ) : null}
            </div>
          </div>
          {view.study ? <VerdictPlate study={view.study} claim={view.declaration.claim} /> : null}
        </div>
        <div className="addr">
          <span>
            <span className="quiet">Permanent address</span>{" "}
            <a href={recordHref(view.record)} className="fig">
              {recordHref(view.record)}
            </a>
          </span>
          <CopyButton text={address} label="Copy address" />
        </div>
      </Sheet>
      <nav className="secnav" aria-label="On this page">
        <a href="#study">Refinement study</a>
        <a href="#findings">Findings</a>
        <a href="#evidence">Evidence</a>
        <a href="#history">History</a>
      </nav>
      <div className="two study pt-6" id="study">
        <section aria-labelledby="study-heading">
          <h2 id="study-heading" className="mb-2.5 text-20">
            Refinement study
          </h2>
          <StudyLedger view={view} />
          <p className="small quiet mt-2">
            Relative norms{outputTime === null ? "" : ` at t = ${outputTime}`}. The order of a pair stands in
            the row of its finer grid. Formulas and sources are on the page <a href="/scoring">Scoring</a>.
          </p>
          <GridConvergenceTable study={view.study} />
        </section>
        <section aria-labelledby="chart-heading">
          <h2 id="chart-heading" className="text-20">
            Convergence
          </h2>
          <Chart
            chart={chart}
            drawings={drawings}
            layout="record"
            label="L1, L2 and max error over nodes per axis, both logarithmic. The table beside it holds the plotted points."
          />
        </section>
      </div>
      <Section id="findings" title="Findings">
        <FindingsList findings={view.findings} />
      </Section>
      <Section id="evidence" title="Evidence">
        <EvidenceLedger runs={view.runs} />
        <EvidenceSummary view={view} />
      </Section>
      <Section id="history" title="History">
        <RecordHistory view={view} />
      </Section>
      <Section id="caution" title="Caution">
        <div className="prose caution">
          This record is evidence about a discretisation on a model problem. It is not a validation of a code
          for a design. Where a result bears on safety, use your own verification and validation procedure and
          licensed practice. The server verified these outputs; it does not prove that the named code made
          them.
        </div>
      </Section>
    </>
  );
}

function Section({ id, title, children }: { id: string; title: string; children: ReactNode }) {
  return (
    <section className="sec" id={id} aria-labelledby={`${id}-heading`}>
      <h2 id={`${id}-heading`} className="mb-3">
        {title}
      </h2>
      {children}
    </section>
  );
}
