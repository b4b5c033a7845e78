import type { Drawings } from "@/app/components/charts/drawings";
import { Sheet } from "@/app/components/layout/sheet";
import { RefusalBox } from "@/app/components/ui/refusal-box";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Refusal } from "../accounts/refusal";
import { DecisionHistory } from "./decision-history";
import { EvidenceLedger } from "./evidence-ledger";
import { FindingsList } from "./findings-list";
import { HandInForm } from "./hand-in-form";
import { outputTimeOf } from "./output-time";
import { ProgressPanel } from "./progress-panel";
import { RunsLedger } from "./runs-ledger";
import { Section } from "./section";
import { StudyChart } from "./study-chart";
import { SubmissionFacts } from "./submission-facts";
import { useProgress } from "./use-progress";
import { VerdictPlate } from "./verdict-plate";

interface SubmissionPageProps {
  submission: SubmissionView;
  drawings: Drawings | undefined;
  refusal: Refusal | undefined;
}

/** A submission before it is listed. */
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
    <Sheet margin={<SubmissionFacts submission={submission} />}>
      <div className="grid items-start gap-x-11 gap-y-6 lg:grid-cols-[minmax(0,1fr)_minmax(0,440px)]">
        <div>
          <h1 className="mb-3 text-34">
            <span className="fig">{solver.name}</span> on{" "}
            <a href={`/problems/${problem.slug}`}>{problem.title}</a>
          </h1>
          {version.description ? <p className="prose mb-4">{version.description}</p> : null}
          <ProgressPanel progress={progress} />
          {state === "failed" ? (
            <p className="prose mb-2">
              The files cannot be scored. What is wrong stands below, each with its place; mend the files and{" "}
              <a href={`/submit?problem=${problem.slug}`}>send the study again</a>.
            </p>
          ) : null}
          <RefusalBox refusals={refusals} />
          <DecisionHistory decisions={decisions} />
          <div className="mt-5">
            <HandInForm submission={submission} refusal={refusal} />
          </div>
        </div>
        {study ? <VerdictPlate study={study} claim={submission.declaration.claim} /> : null}
      </div>
      <SubmissionFigures submission={submission} drawings={drawings} />
    </Sheet>
  );
}

function SubmissionFigures({ submission, drawings }: Omit<SubmissionPageProps, "refusal">) {
  const { runs, study, studies, family, findings, scorerVersion } = submission;
  return (
    <>
      <div className="grid items-start gap-x-11 xl:grid-cols-2">
        <Section id="study" title="Refinement study">
          <RunsLedger runs={runs} study={study} />
        </Section>
        {study ? (
          <Section id="convergence" title="Convergence">
            <StudyChart
              studies={studies}
              family={family}
              outputTime={outputTimeOf(submission)}
              drawings={drawings}
            />
          </Section>
        ) : null}
      </div>
      {scorerVersion ? (
        <Section id="findings" title="Findings">
          <FindingsList findings={findings} />
        </Section>
      ) : null}
      <Section id="evidence" title="Evidence">
        <EvidenceLedger runs={runs} />
      </Section>
    </>
  );
}
