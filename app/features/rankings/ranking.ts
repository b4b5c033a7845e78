import type { Reading } from "@/benchmarks/convergence/nodes-for-tolerance";
import type { Claim } from "@/benchmarks/scoring/declaration";
import type { StudyKind, StudyTail, Verdict } from "@/benchmarks/scoring/result";
import type { Measure, MethodFamily, Precision, RelativeNorm } from "@/drizzle/enums";
import type { ProblemName } from "../problems/problem-view";
import type { BetweenOnlyReason } from "./between-only";
import type { RankBy } from "./ranking-query";

/** What a row of the ranking and a line of "does not reach" have in common. */
export interface RankedSubmission {
  submissionId: string;
  record: { number: number; version: number };
  solver: { slug: string; name: string };
  version: string;
  team: { slug: string; name: string; isHouse: boolean };
  family: MethodFamily;
  /** The basis or stencil in a word or two. */
  method: string;
  claim: Claim;
  /** Null where exponential convergence or nothing is claimed. */
  formalOrder: number | null;
  precision: Precision;
  observed: { kind: StudyKind; order: number | null; rate: number | null; verdict: Verdict };
  tail: StudyTail | null;
}

export interface RankingRow extends RankedSubmission {
  /** Among all listed submissions that reach the tolerance. */
  rank: number;
  /** The rank is shared: shown as 1=. */
  isTied: boolean;
  /** Within the filter, from 1. */
  position: number;
  nodes: number;
  n: number[];
  /** The coarsest run is already below the tolerance. */
  atMost: boolean;
  errorAtReading: number;
  /** Degrees of freedom at the reading, as declared; equal to the nodes where nothing else is declared. */
  unknowns: number;
  /** Declared wall time in seconds at the reading; null where none is declared. */
  cost: number | null;
}

export interface NotReachedRow extends RankedSubmission {
  smallestError: number;
  reason: Extract<Reading, { kind: "notReached" }>["reason"] | "noDeclaredCost" | BetweenOnlyReason;
  /** Nodes along each axis of the run with that error. */
  at: number[];
}

/** One submission's refinement study, for the chart. */
export interface RankingCurve {
  submissionId: string;
  label: string;
  family: MethodFamily;
  points: { n: number[]; nodes: number; intervals: number; error: number }[];
  /** Samples of the interpolant that readings are taken from, so that the ring lies on the line. */
  line: { nodesPerAxis: number; error: number }[];
}

export interface Ranking {
  problem: ProblemName;
  revision: number;
  tolerance: number;
  norm: RelativeNorm;
  measure: Measure;
  by: RankBy;
  rows: RankingRow[];
  /** By smallest error, at most 200. */
  notReached: NotReachedRow[];
  /** Submissions that reach the tolerance within the filter, over all pages. */
  total: number;
  nextCursor: string | null;
  /** Of every submission within the filter, at most 200. */
  curves: RankingCurve[];
}
