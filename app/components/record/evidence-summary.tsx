import { formatDay } from "@/app/components/ui/figures";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import type { Declaration } from "@/benchmarks/scoring/declaration";

/** What the figures were computed with. */
export function EvidenceSummary({ view }: { view: SubmissionView }) {
  const { problem } = view;
  const hasUnknowns = view.runs.some((run) => run.unknowns !== null);
  return (
    <div className="two mt-5">
      <table className="kv text-14">
        <tbody>
          <tr>
            <th scope="row">Scorer</th>
            <td>{view.scorerVersion ?? "not scored"}</td>
          </tr>
          <tr>
            <th scope="row">Test problem</th>
            <td>
              <a href={`/problems/${problem.slug}?revision=${problem.revision}`}>
                {problem.code}, revision {problem.revision}
              </a>
            </td>
          </tr>
          <tr>
            <th scope="row">Scored</th>
            <td>{view.scoredAt ? formatDay(view.scoredAt) : "—"}</td>
          </tr>
        </tbody>
      </table>
      <table className="kv text-14">
        <tbody>
          <tr>
            <th scope="row">Unknowns</th>
            <td>{hasUnknowns ? "as declared" : "as many as nodes"}</td>
          </tr>
          <tr>
            <th scope="row">Reconstruction</th>
            <td>{reconstructionText(view.declaration)}</td>
          </tr>
          <tr>
            <th scope="row">Formula</th>
            <td>
              <a href="/scoring">relative L2, observed order, nodes for a tolerance</a>
            </td>
          </tr>
        </tbody>
      </table>
    </div>
  );
}

function reconstructionText({ reconstruction }: Declaration): string {
  if (!reconstruction) return "none declared";
  if (reconstruction.kind === "piecewise-polynomial")
    return `piecewise polynomial, degree ${reconstruction.degree}`;
  return reconstruction.kind;
}
