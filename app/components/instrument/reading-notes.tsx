import type { FrameScales } from "@/app/components/charts/chart-frame";
import { formatCount } from "@/app/components/ui/figures";
import type { Ranking } from "@/app/features/rankings/ranking";
import { countWord } from "./ranking-words";
import { SlopeFan } from "./slope-fan";

/** What the line reads, in a sentence, and how it is read. */
export function ReadingNotes({ ranking, scales }: { ranking: Ranking; scales: FrameScales }) {
  return (
    <div className="inst-r">
      <p className="note">
        <Reading ranking={ranking} />
      </p>
      <p className="note">
        A curve reaches the line where it falls below and stays below. Nodes are read between the two grids on
        either side and rounded up.
      </p>
      <p className="note fan-note">Slopes at the scale of this chart:</p>
      <SlopeFan scales={scales} />
    </div>
  );
}

function Reading({ ranking: { rows, notReached, total } }: { ranking: Ranking }) {
  const all = total + notReached.length;
  if (all === 0) return <>Nothing to read: no submission passes.</>;
  if (total === 0) return <>No curve reaches the line.</>;
  const [first] = rows;
  const last = rows[rows.length - 1];
  return (
    <>
      <b>{countWord(total)}</b> of {all}{" "}
      {total === 1 ? "reaches the line and stays" : "reach the line and stay"} below it.{" "}
      <code>{first.solver.slug}</code> needs {first.atMost ? "at most " : ""}
      {formatCount(first.nodes)} nodes
      {last.nodes > first.nodes && total === rows.length ? (
        <>
          ; <code>{last.solver.slug}</code> needs {formatCount(last.nodes)},{" "}
          {timesText(last.nodes / first.nodes)} times as many
        </>
      ) : null}
      .
    </>
  );
}

function timesText(ratio: number): string {
  return ratio < 100 ? ratio.toFixed(1) : String(Math.round(ratio));
}
