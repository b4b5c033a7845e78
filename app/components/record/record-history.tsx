import type { ReactNode } from "react";
import { recordHref } from "@/app/components/instrument/ranking-words";
import { formatDay } from "@/app/components/ui/figures";
import type { DecisionView, RecordView } from "@/app/features/submissions/submission-view";
import { submissionStateNames } from "./state-words";

const decisionNames: Record<DecisionView["kind"], string> = {
  list: "Listed",
  return: "Returned",
  withdraw: "Withdrawn",
};

/** What happened to a record, oldest first; a version's address never changes its meaning. */
export function RecordHistory({ view }: { view: RecordView }) {
  const { versions, record, decisions } = view;
  const decided = new Set(decisions.map((decision) => decision.kind));
  const events: { at: Date; said: ReactNode }[] = [
    { at: view.createdAt, said: `Submitted: ${view.runs.length} files.` },
    ...(view.scoredAt ? [{ at: view.scoredAt, said: `Scored by ${view.scorerVersion}.` }] : []),
    ...(view.handedInAt ? [{ at: view.handedInAt, said: "Handed in for review." }] : []),
    ...(decided.has("list")
      ? []
      : [{ at: view.listedAt, said: `Listed as version ${record.version} of record ${record.number}.` }]),
    ...decisions.map((decision) => ({
      at: decision.createdAt,
      said: (
        <>
          {decisionNames[decision.kind]}
          {decision.note ? `, with the note “${decision.note}”` : ""}.
        </>
      ),
    })),
  ];
  events.sort((a, b) => a.at.getTime() - b.at.getTime());
  const others = versions.filter((version) => version.version !== record.version);
  return (
    <>
      <ol className="tl">
        {events.map((event, index) => (
          <li key={index}>
            <time dateTime={event.at.toISOString()}>{formatDay(event.at)}</time>
            <i aria-hidden="true" />
            <span>{event.said}</span>
          </li>
        ))}
      </ol>
      {others.length > 0 ? (
        <p className="text-14">
          Other versions:{" "}
          {others.map((version, index) => (
            <span key={version.version}>
              {index > 0 ? ", " : ""}
              <a href={recordHref(version)}>{recordHref(version)}</a>, {submissionStateNames[version.state]}{" "}
              {formatDay(version.listedAt)}
            </span>
          ))}
          .
        </p>
      ) : null}
    </>
  );
}
