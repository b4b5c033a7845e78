import { formatNodes } from "@/app/components/ui/figures";
import { StateMark } from "@/app/components/ui/state-mark";
import type { Finding } from "@/benchmarks/scoring/result";
import { findingName } from "./finding-names";

/** What the scorer noticed, the gravest first. A finding refuses nothing. */
export function FindingsList({ findings }: { findings: Finding[] }) {
  if (findings.length === 0) return <StateMark state="none">no finding</StateMark>;
  const order = ["strong", "warning", "note"];
  const sorted = [...findings].sort((a, b) => order.indexOf(a.severity) - order.indexOf(b.severity));
  return (
    <ul className="border-t-[1.5px] border-rule">
      {sorted.map((finding) => (
        <li
          key={finding.code + finding.message}
          className="grid gap-x-5 border-b border-hair-2 py-2 text-14 md:grid-cols-[230px_minmax(0,1fr)]"
        >
          <StateMark state={finding.severity === "note" ? "none" : "finding"}>
            {findingName(finding.code)}
            {finding.run ? `, N = ${formatNodes(finding.run)}` : ""}
          </StateMark>
          <span className="text-pretty">{finding.message}</span>
        </li>
      ))}
    </ul>
  );
}
