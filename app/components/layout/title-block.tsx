import { formatDay } from "@/app/components/ui/figures";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";

/** What a page writes into its title block; the rest is the same on every page. */
export interface TitleBlockEntry {
  label: string;
  value: string;
  norm?: string;
}

interface TitleBlockProps {
  entry: TitleBlockEntry;
  readOn: Date;
}

/** The drawing's title block at the foot of every page; it carries the caution once. */
export function TitleBlock({ entry, readOn }: TitleBlockProps) {
  const cells = [
    ["Register", "Backsight, register of solver accuracy"],
    [entry.label, entry.value],
    ["Scorer", scorerVersion],
    ["Norm shown", entry.norm ?? "relative L2 at the nodes"],
    ["Read on", formatDay(readOn)],
  ];
  return (
    <footer className="wrap tb">
      <dl className="tb-in">
        {cells.map(([label, value]) => (
          <div key={label}>
            <dt>{label}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
      <div className="tb-row2">
        <a href="/scoring">Scoring rules</a>
        <a href="/problems">Test problems</a>
        <a href="/records">Records</a>
        <span>
          A rank on model problems is evidence about a discretisation, not a validation of a code for a
          design.
        </span>
      </div>
    </footer>
  );
}
