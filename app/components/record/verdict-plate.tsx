import { formalOrderText, kindNames, verdictNames } from "@/app/components/instrument/ranking-words";
import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Plate } from "@/app/components/ui/plate";
import type { Claim } from "@/benchmarks/scoring/declaration";
import type { Study, StudyTail } from "@/benchmarks/scoring/result";

/** The order verdict with the figures that it rests on. */
export function VerdictPlate({ study, claim }: { study: Study; claim: Claim }) {
  const isRate = study.kind === "exponential";
  const figure = isRate ? study.rate : study.order;
  const share = study.ladders.at(-1);
  return (
    <Plate label="Order of accuracy" verdict={verdictNames[study.verdict]}>
      <div className="flex items-end gap-5">
        <span className="font-figure text-[3.25rem] leading-none tracking-[-0.05em]">
          {figure === null ? "—" : figure.toFixed(2)}
        </span>
        <p className="text-13 leading-snug text-ink-2">
          {isRate ? (
            <>
              decay rate <i>q</i> of ln E per node
            </>
          ) : (
            <>
              observed order <i>p</i>
            </>
          )}
          <br />
          {claim.kind === "algebraic" ? `formal order ${formalOrderText(claim)}` : null}
          {claim.kind === "exponential" ? "exponential convergence claimed" : null}
          {claim.kind === "none" ? "nothing claimed" : null}
        </p>
      </div>
      <table className="kv mt-3.5">
        <tbody>
          <Line label="95 % interval of the fit">{intervalText(study)}</Line>
          <Line label="Kind">{kindNames[study.kind]}</Line>
          <Line label="Leading coefficient C">
            {study.leadingCoefficient === null ? "—" : formatError(study.leadingCoefficient, 3)}
          </Line>
          <Line label={share ? `Share not spatial, N = ${formatNodes(share.n)}` : "Share not spatial"}>
            {share ? `${Number((100 * share.share).toPrecision(2))} %` : "no ladder handed in"}
          </Line>
          <Line label="Round-off floor">{tailText(study.tail)}</Line>
        </tbody>
      </table>
    </Plate>
  );
}

function Line({ label, children }: { label: string; children: string }) {
  return (
    <tr>
      <th scope="row">{label}</th>
      <td>{children}</td>
    </tr>
  );
}

function intervalText({ orderInterval }: Study): string {
  return orderInterval ? `${orderInterval[0].toFixed(2)} to ${orderInterval[1].toFixed(2)}` : "—";
}

function tailText(tail: StudyTail | null): string {
  if (!tail) return "not reached";
  const from = `${formatError(tail.level)} from N = ${formatNodes(tail.from)}`;
  switch (tail.kind) {
    case "floor":
      return from;
    case "stall":
      return `stalls, ${from}`;
    case "floorOrStall":
      return `floor or stall, ${from}`;
    case "short":
      return `short tail, ${from}`;
  }
}
