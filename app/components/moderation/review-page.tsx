import { useRef } from "react";
import { Link } from "react-router";
import type { Drawings } from "@/app/components/charts/drawings";
import { EvidenceLedger } from "@/app/components/record/evidence-ledger";
import { EvidenceSummary } from "@/app/components/record/evidence-summary";
import { FindingsList } from "@/app/components/record/findings-list";
import { StudyLedger } from "@/app/components/record/study-ledger";
import { FamilyMark } from "@/app/components/ui/family-mark";
import { formatDay, formatRecordNumber } from "@/app/components/ui/figures";
import { RefusalBox } from "@/app/components/ui/refusal-box";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Refusal } from "../accounts/refusal";
import { DecisionHistory } from "../submission/decision-history";
import { observedSentence } from "../submission/observed-sentence";
import { outputTimeOf } from "../submission/output-time";
import { Section } from "../submission/section";
import { StudyChart } from "../submission/study-chart";
import { SubmissionStateMark } from "../submission/submission-state-mark";
import { DecisionForm } from "./decision-form";
import { NormsLedger } from "./norms-ledger";
import { SameFiles } from "./same-files";
import { useReviewKeys } from "./use-queue-keys";

interface ReviewPageProps {
  submission: SubmissionView;
  drawings: Drawings | undefined;
  neighbours: { previous: string | null; next: string | null };
  refusal: Refusal | undefined;
}

/** One submission: its evidence beside the note. Figures only, no guessed causes. */
export function ReviewPage({ submission, drawings, neighbours, refusal }: ReviewPageProps) {
  const { study, studies, family, declaration, runs, findings, refusals, decisions } = submission;
  const links = useRef<HTMLElement>(null);
  useReviewKeys(links);
  return (
    <>
      <ReviewNav ref={links} neighbours={neighbours} />
      <ReviewHeading submission={submission} />
      <RefusalBox refusals={refusals} />
      <div className="mt-5 grid items-start gap-x-12 gap-y-3 border-t border-hair bg-sheet px-3.5 pt-4 pb-6 lg:grid-cols-2">
        <div className="min-w-0">
          {study ? (
            <StudyChart
              studies={studies}
              family={family}
              outputTime={outputTimeOf(submission)}
              drawings={drawings}
            />
          ) : (
            <p>There is no score.</p>
          )}
        </div>
        <div className="min-w-0">
          <NormsLedger studies={studies} claim={declaration.claim} />
          {study ? (
            <p className="mt-2 text-13 text-ink-2">
              {observedSentence(study)}
              {study.orderInterval
                ? `; interval of the fit ${study.orderInterval[0].toFixed(2)} to ${study.orderInterval[1].toFixed(2)}`
                : ""}
              . {runs.length} files.
            </p>
          ) : null}
          <DecisionForm submission={submission} refusal={refusal} />
        </div>
      </div>
      <Section id="findings" title="Findings">
        <FindingsList findings={findings} />
        <SameFiles findings={findings} />
      </Section>
      <Section id="runs" title="Runs">
        <StudyLedger view={submission} />
      </Section>
      <Section id="evidence" title="Evidence">
        <EvidenceLedger runs={runs} />
        <EvidenceSummary view={submission} />
      </Section>
      {decisions.length > 0 ? (
        <Section id="decisions" title="Decisions so far">
          <DecisionHistory decisions={decisions} />
        </Section>
      ) : null}
    </>
  );
}

function ReviewNav({
  ref,
  neighbours,
}: { ref: React.Ref<HTMLElement> } & Pick<ReviewPageProps, "neighbours">) {
  const { previous, next } = neighbours;
  return (
    <nav ref={ref} aria-label="Queue" className="crumb flex flex-wrap gap-x-6 gap-y-1">
      <Link to="/moderation" data-key="e">
        Review of submissions
      </Link>
      {previous ? (
        <Link to={`/moderation/${previous}`} data-key="p">
          Previous
        </Link>
      ) : null}
      {next ? (
        <Link to={`/moderation/${next}`} data-key="n">
          Next
        </Link>
      ) : null}
      <span className="ml-auto max-md:hidden">
        Next <kbd className="border border-ink-3 px-1.5">n</kbd>, previous{" "}
        <kbd className="border border-ink-3 px-1.5">p</kbd>, back to the queue{" "}
        <kbd className="border border-ink-3 px-1.5">e</kbd>
      </span>
    </nav>
  );
}

function ReviewHeading({ submission }: { submission: SubmissionView }) {
  const { number, solver, version, team, family, method, problem, record, handedInAt, state } = submission;
  return (
    <>
      <h1 className="text-34">
        <span className="fig">S-{number}</span>, <span className="fig">{solver.name}</span>
      </h1>
      <p className="mt-1.5 flex flex-wrap items-baseline gap-x-5 gap-y-1 text-14">
        <SubmissionStateMark state={state} />
        <span>
          <FamilyMark family={family} className="mr-1 align-[-2px]" />
          {method}, version {version.version}
        </span>
        <span>{team.name}</span>
        <a href={`/problems/${problem.slug}`}>
          {problem.code} {problem.title}, revision {problem.revision}
        </a>
        {handedInAt ? <span>handed in {formatDay(handedInAt)}</span> : null}
        {record ? (
          <a href={`/records/${record.number}/${record.version}`}>
            Record {formatRecordNumber(record.number)}
          </a>
        ) : null}
      </p>
      {version.description ? <p className="prose mt-3">{version.description}</p> : null}
    </>
  );
}
