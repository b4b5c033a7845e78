import { Ledger } from "@/app/components/ui/ledger";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";

type GuidedProblem = Pick<ProblemDefinition, "axes" | "fields" | "grids" | "notes" | "outputTimes">;

/** What a submission to this problem consists of. */
export function HandInGuide({ problem }: { problem: GuidedProblem }) {
  const { axes, fields, grids, outputTimes } = problem;
  const scored = fields.filter((field) => field.isScored).map((field) => field.name);
  const shape = axes.map((axis) => `N${axes.length > 1 ? axis.name : ""}`).join(", ");
  return (
    <section className="sec" id="handing-in" aria-labelledby="handing-in-heading">
      <h2 id="handing-in-heading" className="mb-3">
        Handing in
      </h2>
      <div className="two">
        <Ledger caption="Grids that this problem takes" isCaptionHidden>
          <thead>
            <tr>
              <th scope="col">Grid kind</th>
              <th scope="col">Axis</th>
              <th scope="col">Suggested nodes</th>
            </tr>
          </thead>
          <tbody>
            {axes.flatMap((axis, index) =>
              grids.kinds[index].map((kind) => (
                <tr key={`${axis.name} ${kind}`}>
                  <th scope="row" className="fig">
                    {kind}
                  </th>
                  <td className="fig">{axis.name}</td>
                  <td className="fig">{grids.suggested[kind]?.join(", ") ?? "as you choose"}</td>
                </tr>
              )),
            )}
          </tbody>
        </Ledger>
        <div>
          <div className="prose">
            <p>
              One file for each grid: NPY, NPZ or CSV, holding{" "}
              {scored.length === 1 ? "the field" : "the fields"} <code>{scored.join(", ")}</code> of shape{" "}
              <code>({shape})</code>
              {outputTimes.length > 0 ? ` at t = ${outputTimes.join(", ")}` : ""}. The server computes every
              norm.
            </p>
          </div>
          {problem.notes.map((note) => (
            <p key={note} className="note">
              {note}
            </p>
          ))}
        </div>
      </div>
    </section>
  );
}
