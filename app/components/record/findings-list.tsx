import { StateMark } from "@/app/components/ui/state-mark";
import { formatNodes } from "@/app/components/ui/figures";
import type { Finding } from "@/benchmarks/scoring/result";

const severityNames: Record<Finding["severity"], string> = {
  note: "note",
  warning: "finding",
  strong: "strong finding",
};

/** Figures about the files, without guessed causes. */
export function FindingsList({ findings }: { findings: Finding[] }) {
  if (findings.length === 0) {
    return (
      <ul className="fnd">
        <li>
          <StateMark state="ok">none</StateMark>
          <span>No check of the files or of the study gave a finding.</span>
        </li>
      </ul>
    );
  }
  return (
    <ul className="fnd">
      {findings.map((finding) => (
        <li key={`${finding.code} ${finding.run?.join() ?? ""} ${finding.message}`}>
          <StateMark state={finding.severity === "note" ? "none" : "finding"}>
            {severityNames[finding.severity]}
            {finding.run ? `, N = ${formatNodes(finding.run)}` : ""}
          </StateMark>
          <span>{finding.message}</span>
        </li>
      ))}
    </ul>
  );
}
