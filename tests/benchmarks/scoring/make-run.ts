import type { FieldArray, FieldFile } from "@/benchmarks/formats/field-file";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";

/** A submission on uniform periodic x with nothing else declared. */
export function declare(changes: Partial<Declaration> = {}): Declaration {
  return {
    grid: { x: { kind: "uniform-periodic", descending: false } },
    values: "point",
    reconstruction: null,
    precision: "float64",
    claim: { kind: "none" },
    ...changes,
  };
}

export function declareRun(n: number[], changes: Partial<RunDeclaration> = {}): RunDeclaration {
  return {
    file: `n${n.join("x")}.npz`,
    n,
    role: "study",
    unknowns: null,
    dt: null,
    steps: null,
    wallSeconds: null,
    yardstickSeconds: null,
    ...changes,
  };
}

export function arrayOf(
  values: ArrayLike<number>,
  shape?: number[],
  changes: Partial<FieldArray> = {},
): FieldArray {
  return {
    shape: shape ?? [values.length],
    values: Float64Array.from(values),
    imaginary: null,
    numberType: "float64",
    isFortranOrder: false,
    ...changes,
  };
}

export function fileOf(arrays: Record<string, FieldArray>): FieldFile {
  return { format: "npz", arrays: new Map(Object.entries(arrays)) };
}

/** A steady periodic problem with the exact solution exp(sin x) cos y or, in 1-D, exp(sin x). */
export function steadyProblem(changes: Partial<ProblemDefinition> = {}): ProblemDefinition {
  return {
    slug: "a-test",
    code: "P-99",
    title: "A test",
    statement: "",
    keywords: [],
    classification: {
      domain: "periodic",
      dimension: 1,
      isSteady: true,
      isLinear: true,
      smoothness: { kind: "entire" },
    },
    axes: [{ name: "x", a: 0, b: 2 * Math.PI, kind: "periodic" }],
    fields: [{ name: "u", values: "real", isScored: true }],
    parameters: [],
    expressions: [],
    equations: [],
    initialTime: 0,
    initialConditions: [],
    boundaryConditions: [],
    kinks: [],
    outputTimes: [],
    exact: { kind: "expression", fields: { u: "exp(sin(x))" } },
    grids: { kinds: [["uniform-periodic", "cell-centred", "listed"]], suggested: {} },
    functional: null,
    ranksOnAbsoluteNorms: false,
    checkValues: [],
    notes: [],
    sources: [],
    ...changes,
  };
}

/** The same with time: exp(sin(x - t)) at the given output times. */
export function unsteadyProblem(outputTimes: number[]): ProblemDefinition {
  const problem = steadyProblem({
    outputTimes,
    exact: { kind: "expression", fields: { u: "exp(sin(x - t))" } },
  });
  problem.classification.isSteady = false;
  return problem;
}

/** A bounded problem on [0, 1] in one or two dimensions. */
export function boundedProblem(exact: string, changes: Partial<ProblemDefinition> = {}): ProblemDefinition {
  const problem = steadyProblem({
    axes: [{ name: "x", a: 0, b: 1, kind: "bounded" }],
    exact: { kind: "expression", fields: { u: exact } },
    grids: {
      kinds: [
        [
          "uniform",
          "cell-centred",
          "chebyshev-lobatto",
          "chebyshev-gauss",
          "legendre-lobatto",
          "legendre-gauss",
          "listed",
        ],
      ],
      suggested: {},
    },
    ...changes,
  });
  problem.classification.domain = "bounded";
  return problem;
}
