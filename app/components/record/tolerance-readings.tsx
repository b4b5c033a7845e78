import { formatCount, formatTolerance, formatTotalNodes } from "@/app/components/ui/figures";
import { nodesForTolerance } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { Study } from "@/benchmarks/scoring/result";

interface ToleranceReadingsProps {
  study: Study;
  /** From the page that the reader came from. */
  carried: number | null;
}

const most = 6;

/** Nodes for some decades of tolerance, and for the one that was carried. */
export function ToleranceReadings({ study, carried }: ToleranceReadingsProps) {
  if (study.points.length === 0) return null;
  const tolerances = tolerancesFor(study, carried);
  return (
    <section className="tolc" aria-labelledby="readings">
      <h2 id="readings" className="lab font-label">
        Nodes for a tolerance{" "}
        <span className="font-normal text-ink-2">
          relative L2 at the nodes
          {carried === null ? "" : `; ${formatTolerance(carried)} is carried from the page you came from`}
        </span>
      </h2>
      <dl className="nnt">
        {tolerances.map((tolerance) => (
          <div key={tolerance} className={tolerance === carried ? "at" : undefined}>
            <dt>{formatTolerance(tolerance)}</dt>
            <Reading study={study} tolerance={tolerance} />
          </div>
        ))}
      </dl>
    </section>
  );
}

function Reading({ study, tolerance }: { study: Study; tolerance: number }) {
  const reading = nodesForTolerance(study, tolerance);
  if (reading.kind === "notReached") return <dd className="never">does not reach</dd>;
  return (
    <dd title={formatTotalNodes(reading.n)}>
      {reading.atMost ? "≤ " : ""}
      {formatCount(reading.nodes)}
    </dd>
  );
}

/** Whole decades around what the study spans, ending in the first that it does not reach. */
function tolerancesFor({ points }: Study, carried: number | null): number[] {
  const exponents = points.map((point) => Math.log10(Math.max(point.error, 1e-17)));
  const highest = Math.floor(Math.max(...exponents));
  const lowest = Math.max(-16, Math.floor(Math.min(...exponents)));
  const step = Math.max(1, Math.ceil((highest - lowest + 1) / most));
  const decades: number[] = [];
  for (let k = highest; k > lowest - step; k -= step) decades.push(Number(`1e${k}`));
  const all = carried !== null && !decades.includes(carried) ? [...decades, carried] : decades;
  return all.sort((a, b) => b - a);
}
