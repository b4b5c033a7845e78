import { formatError } from "@/app/components/ui/figures";
import { Ledger } from "@/app/components/ui/ledger";
import { ResidualBar } from "@/app/components/ui/residual-bar";
import type { ConsistencyProof } from "@/benchmarks/problems/consistency-proof";
import type { Source } from "@/benchmarks/problems/definition";

type Check = ConsistencyProof["checks"][number];

const names: Record<Check["what"], string> = {
  equation: "Equation",
  initial: "Initial condition",
  boundary: "Boundary condition",
  periodicity: "Periodicity",
  evaluation: "Values on all grids",
};

interface ProofLedgerProps {
  proof: ConsistencyProof;
  sources: Source[];
}

/** That the exact solution solves the problem, in figures. */
export function ProofLedger({ proof, sources }: ProofLedgerProps) {
  return (
    <div>
      <Ledger caption="Proof of the exact solution">
        <thead>
          <tr>
            <th scope="col">Relative residual</th>
            <th scope="col" className="num">
              Largest
            </th>
            <th scope="col" className="num">
              Limit
            </th>
            <th scope="col" className="w-[32%]">
              Against the limit
            </th>
          </tr>
        </thead>
        <tbody>
          {proof.checks.map((check) => (
            <tr key={`${check.what} ${check.label}`}>
              <th scope="row">
                {names[check.what]}
                <span className="block text-12 break-words text-ink-2">{check.label}</span>
              </th>
              <td className="num">
                {check.what === "evaluation" ? check.largest : formatError(check.largest)}
              </td>
              <td className="num">{check.what === "evaluation" ? 0 : formatError(check.limit, 1)}</td>
              <td>
                <ResidualBar value={check.largest} limit={check.limit || 1} isWithin={check.holds} />
              </td>
            </tr>
          ))}
        </tbody>
      </Ledger>
      <Sources sources={sources} />
    </div>
  );
}

function Sources({ sources }: { sources: Source[] }) {
  if (sources.length === 0) return null;
  return (
    <p className="mt-2.5 text-13 text-pretty text-ink-2">
      Sources:{" "}
      {sources.map((source, index) => (
        <span key={source.citation}>
          {index > 0 ? "; " : ""}
          {source.doi ? <a href={`https://doi.org/${source.doi}`}>{source.citation}</a> : source.citation}
          {source.isFromMemory ? " (stated from memory)" : ""}
        </span>
      ))}
      .
    </p>
  );
}
