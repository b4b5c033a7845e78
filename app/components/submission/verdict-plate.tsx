import { formatError, formatNodes } from "@/app/components/ui/figures";
import { Plate } from "@/app/components/ui/plate";
import type { Claim } from "@/benchmarks/scoring/declaration";
import type { LadderShare, Study, StudyTail } from "@/benchmarks/scoring/result";
import { verdictNames } from "./observed-sentence";

interface VerdictPlateProps {
  study: Study;
  claim: Claim;
}

/** The verdict on the claim, and the figures that it rests on. */
export function VerdictPlate({ study, claim }: VerdictPlateProps) {
  const { kind, order, orderInterval, rate, tail, verdict, leadingCoefficient, ladders } = study;
  const [figure, meaning] =
    order !== null
      ? [order.toFixed(2), "observed order p, finest pair"]
      : rate !== null
        ? [rate.toPrecision(3), "decay of ln E a node"]
        : ["—", "no order can be quoted"];
  return (
    <Plate label="Order of accuracy" verdict={verdictNames[verdict]}>
      <div className="mb-3 flex items-center gap-5">
        <span className="fig text-44 leading-none">{figure}</span>
        <span className="text-13 text-ink-2">
          {meaning}
          <br />
          {claimed(claim)}
        </span>
      </div>
      <table className="kv">
        <tbody>
          <Row label="Interval of the fit">
            {orderInterval ? `${orderInterval[0].toFixed(2)} to ${orderInterval[1].toFixed(2)}` : "none"}
          </Row>
          <Row label="Kind">{kind === "none" ? "none" : kind}</Row>
          <Row label="Leading coefficient">
            {leadingCoefficient === null ? "none" : formatError(leadingCoefficient, 3)}
          </Row>
          {ladders.map((ladder) => (
            <Row key={ladder.role + ladder.n.join()} label={ladderLabel(ladder)}>
              {`${Number((100 * ladder.share).toPrecision(2))} %`}
            </Row>
          ))}
          <Row label="Tail of the study">{tailOf(tail)}</Row>
        </tbody>
      </table>
    </Plate>
  );
}

function Row({ label, children }: { label: string; children: string }) {
  return (
    <tr>
      <th scope="row">{label}</th>
      <td>{children}</td>
    </tr>
  );
}

function claimed(claim: Claim): string {
  if (claim.kind === "algebraic") return `formal order ${claim.order}`;
  return claim.kind === "exponential" ? "claimed exponential" : "nothing claimed";
}

function ladderLabel({ role, n }: LadderShare): string {
  return `Share not spatial, ${role === "timeStep" ? "time step" : "iteration"}, N = ${formatNodes(n)}`;
}

const tails: Record<StudyTail["kind"], string> = {
  floor: "round-off floor",
  stall: "stalls at",
  floorOrStall: "floor or stall at",
  short: "too short to tell, at",
};

function tailOf(tail: StudyTail | null): string {
  if (!tail) return "no floor reached";
  return `${tails[tail.kind]} ${formatError(tail.level)} from N = ${formatNodes(tail.from)}`;
}
