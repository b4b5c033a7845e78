import { Link } from "react-router";
import { ButtonLink } from "@/app/components/ui/button";
import { FamilyMark } from "@/app/components/ui/family-mark";
import { formatDay, formatRecordNumber } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import type { SubmissionSummary } from "@/app/features/submissions/submission-view";
import { observedSentence } from "./observed-sentence";
import { SubmissionStateMark } from "./submission-state-mark";

interface SubmissionsLedgerProps {
  submissions: SubmissionSummary[];
  hasTeam: boolean;
}

/** The submissions of the viewer's teams. */
export function SubmissionsLedger({ submissions, hasTeam }: SubmissionsLedgerProps) {
  return (
    <div className="pt-8">
      <div className="mb-5 flex flex-wrap items-baseline gap-x-6 gap-y-3">
        <h1 className="text-34">Submissions</h1>
        <p className="text-ink-2">
          Of your teams. Until one is listed, only its team and the reviewers see it.
        </p>
        <ButtonLink variant="primary" href="/submit" className="ml-auto">
          Hand in a refinement study
        </ButtonLink>
      </div>
      {submissions.length === 0 ? (
        <Empty hasTeam={hasTeam} />
      ) : (
        <Ledger caption="Submissions, newest first" isCaptionHidden>
          <thead>
            <tr>
              <th scope="col">Submission</th>
              <th scope="col">Solver</th>
              <th scope="col">Team</th>
              <th scope="col">Problem</th>
              <th scope="col" className="num">
                Files
              </th>
              <th scope="col">Observed</th>
              <th scope="col">Sent</th>
              <th scope="col">State</th>
            </tr>
          </thead>
          <tbody>
            {submissions.map((submission) => (
              <SubmissionRow key={submission.id} submission={submission} />
            ))}
          </tbody>
        </Ledger>
      )}
    </div>
  );
}

function SubmissionRow({ submission }: { submission: SubmissionSummary }) {
  const { id, number, solver, version, family, team, problem, runs, observed, createdAt, state, record } =
    submission;
  const address = record ? `/records/${record.number}/${record.version}` : `/submissions/${id}`;
  return (
    <tr>
      <th scope="row" className="fig whitespace-nowrap">
        <a href={address}>
          {record ? `Record ${formatRecordNumber(record.number)}/${record.version}` : `S-${number}`}
        </a>
      </th>
      <td className="fig whitespace-nowrap">
        <FamilyMark family={family} className="mr-1.5 align-[-2px]" />
        {solver.name} {version}
      </td>
      <td>{team.name}</td>
      <td>
        <a href={`/problems/${problem.slug}`} className="fig">
          {problem.code}
        </a>{" "}
        {problem.title}
      </td>
      <td className="num">{runs}</td>
      <td>{observed ? observedSentence(observed) : ""}</td>
      <td className="whitespace-nowrap">
        <time dateTime={createdAt.toISOString()}>{formatDay(createdAt)}</time>
      </td>
      <td>
        <SubmissionStateMark state={state} />
      </td>
    </tr>
  );
}

function Empty({ hasTeam }: { hasTeam: boolean }) {
  return (
    <p className="border border-dashed border-ink-3 px-4.5 py-4 text-17">
      {hasTeam ? (
        "Nothing has been handed in for your teams yet."
      ) : (
        <>
          A submission belongs to a team. <Link to="/account/teams">Make a team</Link> first.
        </>
      )}
    </p>
  );
}
