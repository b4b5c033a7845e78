/** The shapes of a score. They are the API's contract: scripts of users depend on the names. */

/** Domain-integral norms, and the same relative to the exact solution's (null where that norm vanishes). */
export interface Norms {
  l1: number;
  l2: number;
  max: number;
  relL1: number | null;
  relL2: number | null;
  relMax: number | null;
}

export interface TimeScore {
  /** Null for a steady problem. */
  t: number | null;
  nodes: Norms;
  /** Null where no reconstruction is declared. */
  between: Norms | null;
  /** Norms of each field, where there are several. */
  components: { field: string; nodes: Norms; between: Norms | null }[] | null;
}

export interface RunScore {
  /** Nodes along each axis. */
  n: number[];
  nodes: number;
  unknowns: number;
  /** Intervals that refinement divides: geometric mean over the axes. */
  intervals: number;
  times: TimeScore[];
  /** Integral of u minus integral of u*, and the same over the integral of |u*|. */
  massDefect: number | null;
  relMassDefect: number | null;
  boundary: { axis: "x" | "y"; end: "a" | "b"; kind: "dirichlet" | "neumann" | "robin"; residual: number }[];
  /** Takacs (1985): shares of the mean-square error. Null where undefined. */
  takacs: { dissipation: number; dispersion: number; meanSquare: number } | null;
  /** Largest |u*| on the nodes at the last time. */
  exactMax: number;
  /** Facts about the file that findings rest on. */
  reading: RunReading;
}

export interface RunReading {
  format: string;
  numberType: string;
  /** Largest distance of a coordinate from the declared node, over L; null where the file has none. */
  coordinateOffset: number | null;
  wasReversed: boolean;
  hadRepeatedEnd: boolean;
  /** float64 data that hold only float32 values. */
  holdsSinglePrecisionOnly: boolean;
}

export type RelativeNormName = "relL1" | "relL2" | "relMax";
export type MeasureName = "nodes" | "between";

export type StudyKind = "algebraic" | "exponential" | "mixed" | "undecided" | "floor" | "none";
export type Verdict =
  | "confirmed"
  | "near"
  | "below"
  | "above"
  | "notExponential"
  | "undecidable"
  | "none";

export interface StudyTail {
  kind: "floor" | "stall" | "floorOrStall" | "short";
  /** Nodes along each axis of the tail's first run. */
  from: number[];
  level: number;
}

/** One point of the curve that tolerances are read from. */
export interface StudyPoint {
  n: number[];
  nodes: number;
  intervals: number;
  error: number;
  unknowns: number;
  wallSeconds: number | null;
}

export interface Mark {
  tolerance: number;
  nodes: number;
  /** Already below on the coarsest run. */
  atMost: boolean;
}

export interface Study {
  norm: RelativeNormName;
  measure: MeasureName;
  /** Runs of role `study` ordered by intervals, one for each n. */
  points: StudyPoint[];
  pairOrders: number[];
  kind: StudyKind;
  order: number | null;
  orderInterval: [number, number] | null;
  /** Decay of ln E per node, of an exponential study. */
  rate: number | null;
  tail: StudyTail | null;
  verdict: Verdict;
  leadingCoefficient: number | null;
  /** At 10^(-k/2), k = 0..28, as far as the study reaches. */
  marks: Mark[];
}

export interface Finding {
  code: string;
  severity: "note" | "warning" | "strong";
  message: string;
  /** Nodes along each axis of the run it is about; null where it is about the study. */
  run: number[] | null;
  figures: Record<string, number | string | null>;
}

export interface SubmissionScore {
  /** In the order the runs were given. */
  runs: RunScore[];
  /** The headline: relative L2 at the nodes. */
  study: Study;
  /** One for each norm and measure that exists. */
  studies: Study[];
  findings: Finding[];
}
