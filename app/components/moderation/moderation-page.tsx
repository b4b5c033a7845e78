import type { ReactNode } from "react";
import { Link, useSearchParams } from "react-router";
import { Notice } from "@/app/components/ui/notice";
import type { ModerationList } from "@/app/features/moderation/moderation-view";
import {
  moderationTabs,
  type ModerationQuery,
  type ModerationTab,
} from "@/app/features/moderation/moderation-query";
import { FindingFilter } from "./finding-filter";
import { QueueLedger } from "./queue-ledger";

const tabNames: Record<ModerationTab, string> = {
  waiting: "Waiting",
  returned: "Returned",
  listed: "Listed",
  withdrawn: "Withdrawn",
};

interface ModerationPageProps {
  query: ModerationQuery;
  list: ModerationList;
  now: number;
}

export function ModerationPage({ query, list, now }: ModerationPageProps) {
  const [search] = useSearchParams();
  return (
    <>
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1 pt-8">
        <h1 className="text-34">Review of submissions</h1>
        <p className="text-ink-2">Every decision carries a note; the author reads it.</p>
        <p className="ml-auto text-13 text-ink-2 max-md:hidden">
          Next <Key>n</Key>, previous <Key>p</Key>, open evidence <Key>e</Key>
        </p>
      </div>
      {search.has("decided") ? (
        <Notice tone="ok">The decision is made and its note kept with the submission.</Notice>
      ) : null}
      <div className="mt-3.5 flex flex-wrap items-end gap-x-6 gap-y-3 border-b border-hair pb-2.5">
        <ModerationTabs current={query.tab} counts={list.counts} />
        <FindingFilter query={query} codes={list.codes} />
      </div>
      <QueueLedger tab={query.tab} items={list.items} now={now} />
      <p className="mt-3.5 text-13 text-ink-2">
        A submission becomes a record when it is listed. Withdrawing is possible only then, from the record,
        with a note. Nobody decides about a submission of their own team.
      </p>
    </>
  );
}

/** Also above the log, where none of the lists is current. */
export function ModerationTabs({
  current,
  counts,
}: {
  current: ModerationTab | null;
  counts: ModerationList["counts"] | null;
}) {
  return (
    <nav aria-label="Queues" className="flex flex-wrap gap-x-6">
      {moderationTabs.map((tab) => (
        <Tab
          key={tab}
          to={tab === "waiting" ? "/moderation" : `/moderation?tab=${tab}`}
          isCurrent={tab === current}
        >
          {tabNames[tab]} {counts ? <span className="font-figure">{counts[tab]}</span> : null}
        </Tab>
      ))}
      <Tab to="/moderation/log" isCurrent={current === null}>
        Log
      </Tab>
    </nav>
  );
}

function Tab({ to, isCurrent, children }: { to: string; isCurrent: boolean; children: ReactNode }) {
  const look = isCurrent ? "border-ink font-semibold" : "border-transparent";
  return (
    <Link
      to={to}
      aria-current={isCurrent ? "page" : undefined}
      className={`border-b-2 py-1.5 no-underline ${look}`}
    >
      {children}
    </Link>
  );
}

function Key({ children }: { children: string }) {
  return <kbd className="border border-ink-3 px-1.5 font-figure text-12">{children}</kbd>;
}
