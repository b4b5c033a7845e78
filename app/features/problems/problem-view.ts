import type { ConsistencyProof } from "@/benchmarks/problems/consistency-proof";
import type {
  Axis,
  BoundaryCondition,
  Classification,
  ProblemDefinition,
} from "@/benchmarks/problems/definition";
import type { TypesetProblem } from "@/benchmarks/problems/typeset";
import type { MethodFamily, RevisionState } from "@/drizzle/enums";

/** What names a problem in a list, a row or a heading. */
export interface ProblemName {
  slug: string;
  /** P-01 for a periodic problem, B-01 for a bounded one. */
  code: string;
  title: string;
}

/** One line of the catalogue. */
export interface ProblemSummary extends ProblemName {
  classification: Classification;
  axes: Axis[];
  /** Kinds of boundary condition that occur; empty for a periodic problem. */
  boundaryKinds: BoundaryCondition["kind"][];
  /** The equations as one formula of LaTeX. */
  equationsLatex: string;
  revision: number;
  /** Listed records on the current revision. */
  records: number;
  /** Method families among them. */
  families: MethodFamily[];
  /** Fewest nodes for a relative L2 error of 1e-6 at the nodes; null where no record reaches it. */
  best: { nodes: number; atMost: boolean } | null;
}

export interface RevisionSummary {
  number: number;
  state: RevisionState;
  publishedAt: Date | null;
  whatChanged: string;
}

export interface ProblemView extends ProblemName {
  revision: number;
  definition: ProblemDefinition;
  proof: ConsistencyProof | null;
  publishedAt: Date | null;
  /** False for a retired revision, which is shown with a notice. */
  isCurrent: boolean;
  typeset: TypesetProblem;
  /** Newest first; drafts are left out. */
  revisions: RevisionSummary[];
}
