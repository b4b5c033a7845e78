import type { GridKind } from "../grids/grid-kind";
import type { ProblemDefinition } from "../problems/definition";
import type { Claim, Reconstruction } from "../scoring/declaration";

/** What a reference solver hands in for one grid. */
export interface SolvedRun {
  /** Nodes along each axis. */
  n: number[];
  /** Ascending nodes of each axis. */
  coordinates: Float64Array[];
  /** By field: row-major, first axis slowest. */
  fields: Record<string, { values: Float64Array; imaginary: Float64Array | null }>;
  /** Mean time step; null where time is integrated exactly or the problem is steady. */
  dt: number | null;
  steps: number | null;
}

/** A solver of the house's own: it proves the problems solvable and gives every ranking its yardsticks. */
export interface ReferenceSolver {
  slug: string;
  name: string;
  family: "finiteDifference" | "compactDifference" | "fourier" | "chebyshev";
  /** One line, as a record shows it. */
  method: string;
  /** Formal order where there is one. */
  formalOrder: number | null;
  claim: Claim;
  version: string;
  description: string;
  /** Slugs of the problems it solves. */
  problems: string[];
  /** The kind of grid on each axis of a problem. */
  gridKinds(problemSlug: string): GridKind[];
  reconstruction: Reconstruction | null;
  /** Nodes along each axis for each grid of a refinement study. */
  suggestedNodes(problemSlug: string): number[][];
  /** Solves the problem to its last output time. */
  solve(problem: ProblemDefinition, n: number[]): SolvedRun;
}

/** Solves one problem with one scheme; the nodes are those along each axis. */
export type ProblemSolver<Scheme> = (problem: ProblemDefinition, n: number[], scheme: Scheme) => SolvedRun;
