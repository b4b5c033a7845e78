import type { Drawings } from "@/app/components/charts/drawings";
import { Sheet } from "@/app/components/layout/sheet";
import { EvidenceLedger } from "@/app/components/record/evidence-ledger";
import { EvidenceSummary } from "@/app/components/record/evidence-summary";
import { FindingsList } from "@/app/components/record/findings-list";
import { GridConvergenceTable } from "@/app/components/record/grid-convergence-table";
import { RecordFacts } from "@/app/components/record/record-facts";
import { StudyLedger } from "@/app/components/record/study-ledger";
import { VerdictPlate } from "@/app/components/record/verdict-plate";
import { RefusalBox } from "@/app/components/ui/refusal-box";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Refusal } from "../accounts/refusal";
import { DecisionHistory } from "./decision-history";
import { HandInForm } from "./hand-in-form";
import { outputTimeOf } from "./output-time";
import { ProgressPanel } from "./progress-panel";
import { RunStates } from "./run-states";
import { Section } from "./section";
import { StudyChart } from "./study-chart";
import { useProgress } from "./use-progress";

interface SubmissionPageProps {
  submission: SubmissionView;
  drawings: Drawings | undefined;
  refusal: Refusal | undefined;
}

/** A submission before it is listed: the record that it may become, and what there is to do. */
export function SubmissionPage({ submission, drawings, refusal }: SubmissionPageProps) {
  const { id, state, runs, study, problem, solver, version, decisions, refusals } = submission;
  const count = (runState: string) => runs.filter((run) => run.state === runState).length;
  const progress = useProgress(id, {
    state,
    runs: runs.length,
    scored: count("scored"),
    refused: count("refused"),
  });
  return (
    <>
      <p className="crumb">
        <a href="/submissions">Submissions</a>,{" "}
        <a href={`/problems/${problem.slug}`}>
          {problem.code} {problem.title}
        </a>
      </p>
      <Sheet className="!pt-0" margin={<RecordFacts view={submission} />}>
        <div className="ttl rec">
          <div>
            <h1>
              <code>{solver.slug}</code> on {problem.title}
            </h1>
            {version.description ? (
              <div className="prose">
                <p>{version.description}</p>
              </div>
            ) : null}
            <ProgressPanel progress={progress} />
            {state === "failed" ? <FailedNote slug={problem.slug} /> : null}
            <RefusalBox refusals={refusals} />
            <DecisionHistory decisions={decisions} />
            <div className="mt-6">
              <HandInForm submission={submission} refusal={refusal} />
            </div>
          </div>
          {study ? <VerdictPlate study={study} claim={submission.declaration.claim} /> : null}
        </div>
      </Sheet>
      <SubmissionFigures submission={submission} drawings={drawings} />
    </>
  );
}

function FailedNote({ slug }: { slug: string }) {
  return (
    <div className="prose">
      <p>
        The files cannot be scored. What is wrong stands below, each with its place; mend the files and{" "}
        <a href={`/submit?problem=${slug}`}>send the study again</a>.
      </p>
    </div>
  );
}

function SubmissionFigures({ submission, drawings }: Omit<SubmissionPageProps, "refusal">) {
  const { runs, study, studies, family, findings, scorerVersion } = submission;
  return (
    <>
      {study ? (
        <div className="two study pt-6">
          <section aria-labelledby="study-heading">
            <h2 id="study-heading" className="mb-2.5 text-20">
              Refinement study
            </h2>
            <StudyLedger view={submission} />
            <GridConvergenceTable study={study} />
          </section>
          <section aria-labelledby="chart-heading">
            <h2 id="chart-heading" className="text-20">
              Convergence
            </h2>
            <StudyChart
              studies={studies}
              family={family}
              outputTime={outputTimeOf(submission)}
              drawings={drawings}
            />
          </section>
        </div>
      ) : (
        <Section id="runs" title="Runs">
          <RunStates runs={runs} />
        </Section>
      )}
      {scorerVersion ? (
        <Section id="findings" title="Findings">
          <FindingsList findings={findings} />
        </Section>
      ) : null}
      <Section id="evidence" title="Evidence">
        <EvidenceLedger runs={runs} />
        <EvidenceSummary view={submission} />
      </Section>
    </>
  );
}
