/** The data that a test problem consists of. The shipped problems and the editor's own share this shape. */

import type { GridKind } from "../grids/grid-kind";

export type Smoothness =
  | { kind: "entire" }
  /** Analytic in a strip about the real axis; half-width in units of the axis. */
  | { kind: "analytic"; stripHalfWidth: number }
  /** k continuous derivatives. */
  | { kind: "finite"; continuousDerivatives: number }
  | { kind: "discontinuous" };

export interface Classification {
  /** Bounded as soon as one axis is. */
  domain: "periodic" | "bounded";
  dimension: 1 | 2;
  isSteady: boolean;
  isLinear: boolean;
  smoothness: Smoothness;
}

export interface Axis {
  name: "x" | "y";
  /** Interval [a, b]. */
  a: number;
  b: number;
  kind: "periodic" | "bounded";
}

export interface Field {
  name: string;
  values: "real" | "complex";
  /** Auxiliary fields (a stream function) only help to state the equations. */
  isScored: boolean;
}

export interface Parameter {
  name: string;
  value: number;
  /** A unit, or "dimensionless". */
  unit: string;
  meaning: string;
}

/** A source term or coefficient that the equations and conditions refer to by name. */
export interface NamedExpression {
  name: string;
  expression: string;
  meaning: string;
}

export interface InitialCondition {
  field: string;
  /** 0: the field itself; 1: its time derivative, where the equation is of second order in time. */
  timeDerivative: 0 | 1;
  expression: string;
  /** The condition holds only for t -> 0+ (data that disagree with the boundary). */
  isLimit?: boolean;
}

/** alpha*u + beta*du/dn = g, n outward. Dirichlet has alpha = 1, beta = 0; Neumann alpha = 0, beta = 1. */
export interface BoundaryCondition {
  field: string;
  axis: "x" | "y";
  end: "a" | "b";
  kind: "dirichlet" | "neumann" | "robin";
  /** Expressions of the parameters, the other axis and t. */
  alpha: string;
  beta: string;
  g: string;
}

export type ExactSolution =
  /** An expression of x, y, t and the parameters for each field. */
  | { kind: "expression"; fields: Record<string, string> }
  /** A named solution in benchmarks/problems/built-ins, for integrals, series and inverse maps. */
  | { kind: "builtIn"; name: string };

export interface CheckValue {
  field: string;
  at: { x: number; y?: number; t?: number };
  value: number;
  imaginary?: number;
}

export interface Source {
  citation: string;
  doi?: string;
  /** True where the citation is stated from memory. */
  isFromMemory: boolean;
}

export interface ProblemDefinition {
  slug: string;
  /** P-01 for a periodic problem, B-01 for a bounded one. */
  code: string;
  title: string;
  /** One paragraph: what it is and what it exercises. */
  statement: string;
  keywords: string[];
  classification: Classification;
  axes: Axis[];
  fields: Field[];
  parameters: Parameter[];
  expressions: NamedExpression[];
  /** One identity for each field: `u_t + c*u_x = 0`. */
  equations: { field: string; identity: string }[];
  initialTime: number;
  initialConditions: InitialCondition[];
  boundaryConditions: BoundaryCondition[];
  /** Places where the solution or a derivative jumps, as expressions of t. */
  kinks: string[];
  /** Empty for a steady problem. */
  outputTimes: number[];
  exact: ExactSolution;
  grids: {
    /** Kinds allowed on each axis, in the order of `axes`. */
    kinds: GridKind[][];
    /** Suggested nodes per axis for each kind. */
    suggested: Partial<Record<GridKind, number[]>>;
  };
  /** Integrand of the functional; null for u^2. */
  functional: string | null;
  /** Rank on absolute norms: the solution vanishes at the final time. */
  ranksOnAbsoluteNorms: boolean;
  checkValues: CheckValue[];
  /** Remarks for authors, such as final times at which a Fourier result means nothing. */
  notes: string[];
  sources: Source[];
}
