import { nodesForTolerance, type Reading } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { Study } from "@/benchmarks/scoring/result";
import type { BetweenOnlyReason } from "./between-only";
import type { RankBy } from "./ranking-query";

/** What ordering needs to know of one listed submission. */
export interface Candidate {
  submissionId: string;
  handedInAt: Date;
  study: Study;
  /** Set where the measure is one that this study does not rank on. */
  barredBy: BetweenOnlyReason | null;
}

export interface Reached<C extends Candidate> {
  candidate: C;
  rank: number;
  isTied: boolean;
  reading: Extract<Reading, { kind: "reached" }>;
  /** What is ranked by: nodes, unknowns or declared seconds. */
  value: number;
}

export interface NotReached<C extends Candidate> {
  candidate: C;
  smallestError: number;
  reason: Extract<Reading, { kind: "notReached" }>["reason"] | "noDeclaredCost" | BetweenOnlyReason;
  at: number[];
}

/** The order of rows; also what a cursor holds. */
export type SortKey = [value: number, errorAtReading: number, handedInAt: number, submissionId: string];

export function sortKeyOf(row: Reached<Candidate>): SortKey {
  const { candidate, reading, value } = row;
  return [value, reading.errorAtReading, candidate.handedInAt.getTime(), candidate.submissionId];
}

export function compareSortKeys(a: SortKey, b: SortKey): number {
  for (const index of [0, 1, 2, 3] as const) {
    if (a[index] < b[index]) return -1;
    if (a[index] > b[index]) return 1;
  }
  return 0;
}

/**
 * Ranks all candidates at a tolerance. Equal values share a rank (1=, 1=, 3); within a tie the smaller error at the
 * reading comes first, then the earlier hand-in. The rest follows by the error it stops at.
 */
export function rankStudies<C extends Candidate>(
  candidates: C[],
  tolerance: number,
  by: RankBy,
): { reached: Reached<C>[]; notReached: NotReached<C>[] } {
  const reached: Reached<C>[] = [];
  const notReached: NotReached<C>[] = [];
  for (const candidate of candidates) {
    const reading = nodesForTolerance(candidate.study, tolerance);
    const { barredBy } = candidate;
    if (reading.kind === "reached" && barredBy !== null) {
      notReached.push({ candidate, smallestError: reading.errorAtReading, reason: barredBy, at: reading.n });
      continue;
    }
    if (reading.kind === "notReached") {
      const { smallestError, reason, at } = reading;
      notReached.push({ candidate, smallestError, reason, at });
      continue;
    }
    const value = reading[by];
    if (value === null) {
      notReached.push({
        candidate,
        smallestError: reading.errorAtReading,
        reason: "noDeclaredCost",
        at: reading.n,
      });
    } else {
      reached.push({ candidate, rank: 0, isTied: false, reading, value });
    }
  }
  reached.sort((a, b) => compareSortKeys(sortKeyOf(a), sortKeyOf(b)));
  for (const [index, row] of reached.entries()) {
    const before = reached[index - 1];
    const isEqual = before?.value === row.value;
    row.rank = isEqual ? before.rank : index + 1;
    if (isEqual) row.isTied = before.isTied = true;
  }
  notReached.sort(
    (a, b) =>
      a.smallestError - b.smallestError ||
      a.candidate.handedInAt.getTime() - b.candidate.handedInAt.getTime() ||
      (a.candidate.submissionId < b.candidate.submissionId ? -1 : 1),
  );
  return { reached, notReached };
}
