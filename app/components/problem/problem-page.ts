import type { ProblemView } from "@/app/features/problems/problem-view";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import type { DomainFigure } from "./domain-figure";
import type { GivenNumber } from "./given-numbers";

/** A problem as its page shows it: formulas typeset, the drawing worked out. */
export interface ProblemPage extends Pick<
  ProblemView,
  "slug" | "code" | "title" | "revision" | "publishedAt" | "isCurrent" | "proof" | "revisions"
> {
  definition: Pick<
    ProblemDefinition,
    | "statement"
    | "classification"
    | "axes"
    | "boundaryConditions"
    | "sources"
    | "fields"
    | "grids"
    | "notes"
    | "outputTimes"
  >;
  rows: { label: string; formulas: string[] }[];
  intervals: string[];
  numbers: GivenNumber[];
  figure: DomainFigure;
}
