import { Link } from "react-router";
import { sameFileCode } from "@/app/features/scoring/same-file-code";
import type { Finding } from "@/benchmarks/scoring/result";

/** Leads to the submissions that hold the same bytes. */
export function SameFiles({ findings }: { findings: Finding[] }) {
  const same = findings.filter((finding) => finding.code === sameFileCode);
  if (same.length === 0) return null;
  const others = new Map(same.map(({ figures, message }) => [String(figures.submission), message]));
  return (
    <ul className="mt-3 grid gap-1 text-14">
      {[...others].map(([id, message]) => (
        <li key={id}>
          <Link to={`/moderation/${id}`}>The other submission</Link>{" "}
          <span className="text-ink-2">{message}</span>
        </li>
      ))}
    </ul>
  );
}
