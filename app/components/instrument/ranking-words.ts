import { formatError, formatNodes } from "@/app/components/ui/figures";
import type { NotReachedRow, RankedSubmission, RankingCurve } from "@/app/features/rankings/ranking";
import type { Claim } from "@/benchmarks/scoring/declaration";
import type { StudyKind, Verdict } from "@/benchmarks/scoring/result";
import type { Measure, RelativeNorm } from "@/drizzle/enums";

export const normNames: Record<RelativeNorm, string> = { relL1: "L1", relL2: "L2", relMax: "max" };

export const verdictNames: Record<Verdict, string> = {
  confirmed: "confirmed",
  near: "near",
  below: "below",
  above: "above",
  notExponential: "not exponential",
  undecidable: "undecidable",
  none: "none claimed",
};

export const kindNames: Record<StudyKind, string> = {
  algebraic: "algebraic",
  exponential: "exponential",
  mixed: "mixed",
  undecided: "undecided",
  floor: "round-off only",
  none: "none",
};

/** "relative L2 error at the nodes, t = 3": the title of the error axis. */
export function errorTitle(norm: RelativeNorm, measure: Measure, outputTime: number | null): string {
  const place = measure === "nodes" ? "at the nodes" : "between the nodes";
  const time = outputTime === null ? "" : `, t = ${outputTime}`;
  return `relative ${normNames[norm]} error ${place}${time}`;
}

export function normCell(norm: RelativeNorm, measure: Measure): string {
  return `relative ${normNames[norm]} ${measure === "nodes" ? "at the nodes" : "between the nodes"}`;
}

export function formalOrderText(claim: Claim): string {
  if (claim.kind === "algebraic") return String(claim.order);
  return claim.kind === "exponential" ? "exp." : "—";
}

/** Order p, or decay rate q of an exponential study. */
export function observedOf({ kind, order, rate }: RankedSubmission["observed"]) {
  if (kind === "exponential" && rate !== null) return { symbol: "q", value: rate.toFixed(2) };
  return order === null ? null : { symbol: "p", value: order.toFixed(2) };
}

/** Why a submission does not reach the line, with its figure. */
export function reasonText(row: NotReachedRow, tolerance: number, curve: RankingCurve | undefined): string {
  const error = formatError(row.smallestError);
  const nodes = formatNodes(row.at);
  switch (row.reason) {
    case "endsAbove":
      return `ends above the line, ${error} at N = ${nodes}`;
    case "floorAbove":
      return `round-off floor ${formatError(row.tail?.level ?? row.smallestError)} lies above the line`;
    case "stalls":
      return row.tail
        ? `stalls at ${formatError(row.tail.level)} from N = ${formatNodes(row.tail.from)}`
        : `stalls at ${error}, N = ${nodes}`;
    case "risesAgain":
      return risingText(curve, tolerance) ?? `rises above the line again, ${error} at N = ${nodes}`;
    case "singleRun":
      return `single run, ${error} at N = ${nodes}`;
    case "noDeclaredCost":
      return "no wall time declared at its reading";
    case "exactAtNodes":
      return "exact at the nodes on grids that cannot carry it: ranks between nodes only";
    case "gapTooWide":
      return "a gap of its grid is wider than 4L/N: ranks between nodes only";
  }
}

function risingText(curve: RankingCurve | undefined, tolerance: number): string | null {
  const points = curve?.points ?? [];
  const last = points.findLastIndex((point) => point.error <= tolerance);
  const above = points[last + 1];
  if (last < 0 || !above) return null;
  const first = points.findLastIndex((point, index) => index < last && point.error > tolerance) + 1;
  return `falls below at N = ${formatNodes(points[first].n)}, rises above again at N = ${formatNodes(above.n)}`;
}

/** A decade up or down keeps the digits that were given. */
export function shiftDecade(tolerance: number, decades: 1 | -1): number {
  const [mantissa, exponent] = tolerance.toExponential().split("e");
  return Number(`${mantissa}e${Number(exponent) + decades}`);
}

const longestName = 17;

/** Long names lose their middle, since the ends tell versions apart. */
export function cutMiddle(name: string): string {
  if (name.length <= longestName) return name;
  return `${name.slice(0, 9)}…${name.slice(-7)}`;
}

export function recordHref({ number, version }: { number: number; version: number }): string {
  return `/records/${number}/${version}`;
}

const words = [
  "None",
  "One",
  "Two",
  "Three",
  "Four",
  "Five",
  "Six",
  "Seven",
  "Eight",
  "Nine",
  "Ten",
  "Eleven",
  "Twelve",
];

/** A count at the beginning of a sentence. */
export function countWord(count: number): string {
  return words[count] ?? String(count);
}
