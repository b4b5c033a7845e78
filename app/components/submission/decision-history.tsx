import { formatDay } from "@/app/components/ui/figures";
import type { DecisionView } from "@/app/features/submissions/submission-view";
import type { DecisionKind } from "@/drizzle/enums";

const kinds: Record<DecisionKind, string> = { list: "Listed", return: "Returned", withdraw: "Withdrawn" };

/** Each decision with its note, the latest last. */
export function DecisionHistory({ decisions }: { decisions: DecisionView[] }) {
  if (decisions.length === 0) return null;
  return (
    <ul className="grid gap-2">
      {decisions.map((decision) => (
        <li key={decision.createdAt.toISOString()} className="border-l-3 border-ink pl-3 text-14">
          <b>{kinds[decision.kind]}</b>{" "}
          <time dateTime={decision.createdAt.toISOString()} className="text-ink-2">
            {formatDay(decision.createdAt)}
          </time>
          <p className="max-w-[64ch] font-display text-17 whitespace-pre-line">“{decision.note}”</p>
        </li>
      ))}
    </ul>
  );
}
