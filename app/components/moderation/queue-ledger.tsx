import { type ReactNode, useRef } from "react";
import { Link } from "react-router";
import { FamilyMark } from "@/app/components/ui/family-mark";
import { Ledger } from "@/app/components/ui/ledger";
import { StateMark } from "@/app/components/ui/state-mark";
import type { ModerationItem } from "@/app/features/moderation/moderation-view";
import type { ModerationTab } from "@/app/features/moderation/moderation-query";
import { observedSentence } from "../submission/observed-sentence";
import { findingName } from "./finding-names";
import { useQueueKeys } from "./use-queue-keys";
import { waitingTime } from "./waiting-time";

interface QueueLedgerProps {
  tab: ModerationTab;
  items: ModerationItem[];
  now: number;
}

export function QueueLedger({ tab, items, now }: QueueLedgerProps) {
  const table = useRef<HTMLDivElement>(null);
  useQueueKeys(table);
  if (items.length === 0) return <p className="mt-6 text-17">No submission is in this list.</p>;
  return (
    <div ref={table} className="mt-4.5">
      <Ledger
        caption={tab === "waiting" ? "Submissions waiting, oldest first" : "Submissions, latest first"}
        isCaptionHidden
        className="max-md:block"
      >
        <thead className="max-md:hidden">
          <tr>
            <th scope="col" className="num w-[84px]">
              {tab === "waiting" ? "Waiting" : "Handed in"}
            </th>
            <th scope="col" className="w-[96px] pl-3">
              Submission
            </th>
            <th scope="col">Solver and team</th>
            <th scope="col" className="w-[86px]">
              Problem
            </th>
            <th scope="col">Findings</th>
            <th scope="col" className="num">
              Decision
            </th>
          </tr>
        </thead>
        <tbody className="max-md:block">
          {items.map((item) => (
            <QueueRow key={item.id} item={item} tab={tab} now={now} />
          ))}
        </tbody>
      </Ledger>
    </div>
  );
}

function QueueRow({ item, tab, now }: { item: ModerationItem; tab: ModerationTab; now: number }) {
  return (
    <tr className="*:py-2.5 *:align-top focus-within:bg-sheet max-md:grid max-md:grid-cols-[1fr_auto] max-md:gap-x-3 max-md:gap-y-1 max-md:border-b max-md:border-hair-2 max-md:py-2.5 max-md:*:border-0 max-md:*:p-0">
      <td className="num max-md:col-start-2 max-md:row-start-1">
        <time dateTime={item.handedInAt.toISOString()}>{waitingTime(item.handedInAt, now)}</time>
      </td>
      <td className="pl-3 font-figure max-md:col-start-1 max-md:row-start-1 max-md:pl-0">
        <Link to={`/moderation/${item.id}`}>S-{item.number}</Link>
      </td>
      <th scope="row">
        <span className="inline-flex items-center gap-1.5 font-figure text-15 font-medium">
          <FamilyMark family={item.family} />
          {item.solver.name}
        </span>
        <Small>{item.team.name}</Small>
      </th>
      <td className="font-figure max-md:text-right">{item.problem.code}</td>
      <td className="max-md:col-span-2">
        <Findings item={item} />
      </td>
      <td className="num whitespace-normal max-md:col-span-2 max-md:text-left">
        <Decision item={item} tab={tab} />
      </td>
    </tr>
  );
}

function Findings({ item }: { item: ModerationItem }) {
  const [first, ...others] = item.findings;
  const observed = item.observed ? observedSentence(item.observed) : "not scored";
  if (!first) {
    return (
      <>
        <StateMark state="none">no finding</StateMark>
        <Small>{observed}</Small>
      </>
    );
  }
  return (
    <>
      <StateMark state="finding">{findingName(first.code)}</StateMark>
      <Small>{first.message}</Small>
      <Small>
        {others.length > 0 ? `Also ${others.map((other) => findingName(other.code)).join(", ")}; ` : ""}
        {observed}
      </Small>
    </>
  );
}

function Decision({ item, tab }: { item: ModerationItem; tab: ModerationTab }) {
  const label = tab === "waiting" ? "Evidence" : "Figures";
  return (
    <>
      {item.decision && tab !== "waiting" ? (
        <span className="block text-13 text-ink-2">“{item.decision.note}”</span>
      ) : null}
      {item.record ? (
        <Link to={`/records/${item.record.number}/${item.record.version}`} className="mr-3 font-figure">
          Record {String(item.record.number).padStart(4, "0")}
        </Link>
      ) : null}
      <Link to={`/moderation/${item.id}`} data-evidence>
        {label}
        <span className="sr-only"> of S-{item.number}</span>
      </Link>
      {item.isOwnTeam ? <Small>your team: another admin decides</Small> : null}
    </>
  );
}

function Small({ children }: { children: ReactNode }) {
  return <small className="block font-label text-13 leading-snug text-ink-2">{children}</small>;
}
