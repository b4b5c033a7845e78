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
  /** Intervals along each axis. */
  axisIntervals: number[];
  times: TimeScore[];
  /** Integral of u minus integral of u*, and the same over the integral of |u*|. */
  massDefect: number | null;
  relMassDefect: number | null;
  boundary: { axis: "x" | "y"; end: "a" | "b"; kind: "dirichlet" | "neumann" | "robin"; residual: number }[];
  /** Takacs (1985): shares of the mean-square error. Null where undefined. */
  takacs: { dissipation: number; dispersion: number; meanSquare: number } | null;
  /** Largest |u*| on the nodes at the last time. */
  exactMax: number;
  /** Largest error in the outer tenth of the domain and in the rest, at the last time. */
  maxNearEnds: number | null;
  maxInside: number | null;
  /** The problem's functional (the integral of u^2 unless it says otherwise) by the grid's weights; null for complex data. */
  functional: number | null;
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
  /** Most significant decimal digits that any value carries; null where some value needs more than 8. */
  significantDigits: number | null;
  /** Largest error over the largest |u*|; below 8 eps the run equals the exact solution at its nodes. */
  errorOverMax: number;
  /** Error of the interpolant of u* on these nodes, relative to max |u*|; only where the run equals u*. */
  interpolantError: number | null;
  /** Relative L2 error when read as n - 1 intervals with both ends as nodes; periodic axes only. */
  endIncludedError: number | null;
  /** Relative L2 error with the axes exchanged; 2-D with as many nodes on both axes only. */
  transposedError: number | null;
  /** The shift of the output time that makes the error smallest, and by what factor; unsteady problems only. */
  timeShift: { shift: number; factor: number } | null;
  /** A listed grid's largest gap, in units of L/N; null for other kinds. */
  largestGap: number | null;
  /** Values and errors at every `strides`-th node, for comparing runs at the nodes they share. */
  sample: { strides: number[]; values: number[]; errors: number[] } | null;
}

export type RelativeNormName = "relL1" | "relL2" | "relMax";
export type MeasureName = "nodes" | "between";

export type StudyKind = "algebraic" | "exponential" | "mixed" | "undecided" | "floor" | "none";
export type Verdict = "confirmed" | "near" | "below" | "above" | "notExponential" | "undecidable" | "none";

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
  /** Geometric mean of `axisIntervals`. */
  intervals: number;
  /** Intervals along each axis. */
  axisIntervals: number[];
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
  /** Of the problem's functional on the three finest runs; null where there are fewer or it does not apply. */
  gridConvergence: GridConvergence | null;
  /** Share of the error that is not spatial, from runs of roles `timeStep` and `iteration`. */
  ladders: LadderShare[];
}

/** The grid convergence index (Celik et al. 2008) beside the true error. */
export interface GridConvergence {
  /** Apparent order; null where the index is undefined, as for values that do not differ. */
  order: number | null;
  extrapolated: number | null;
  /** Relative uncertainty of the finest value. */
  index: number | null;
  /** Relative error of the finest value against the exact functional. */
  trueError: number | null;
  /** The index is at least the true error. */
  isCovered: boolean | null;
}

/** What a ladder in time or iteration shows on one grid. */
export interface LadderShare {
  role: "timeStep" | "iteration";
  n: number[];
  /** Largest change of the error along the ladder, over the study run's error. */
  share: number;
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
