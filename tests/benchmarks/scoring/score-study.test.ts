import { describe, expect, it } from "vitest";
import { nodesOf } from "@/benchmarks/grids/grid-nodes";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import { scoreRun } from "@/benchmarks/scoring/score-run";
import { scoreStudy } from "@/benchmarks/scoring/score-study";
import {
  arrayOf,
  boundedProblem,
  declare,
  declareRun,
  fileOf,
  steadyProblem,
  unsteadyProblem,
} from "./make-run";

const exact = (x: number) => Math.exp(Math.sin(x));
const periodicNodes = (n: number) => nodesOf("uniform-periodic", n, 0, 2 * Math.PI);

interface Given {
  problem?: ProblemDefinition;
  declaration?: Partial<Declaration>;
  ns?: number[];
  /** The field of a run of n nodes at its coordinates. */
  u: (x: number, n: number) => number;
  runOf?: (n: number) => Partial<RunDeclaration>;
  extra?: { n: number; u: (x: number) => number; role: RunDeclaration["role"] }[];
}

function studyOf({
  problem = steadyProblem(),
  declaration = {},
  ns = [16, 32, 64],
  u,
  runOf,
  extra = [],
}: Given) {
  const declared = declare(declaration);
  const all = [
    ...ns.map((n) => ({ run: declareRun([n], runOf?.(n)), values: periodicNodes(n).map((x) => u(x, n)) })),
    ...extra.map(({ n, u: field, role }) => ({
      run: declareRun([n], { role }),
      values: periodicNodes(n).map(field),
    })),
  ];
  const runs = all.map(({ run, values }) => ({
    declaration: run,
    score: scoreRun(problem, declared, run, fileOf({ u: arrayOf(values) })),
  }));
  return scoreStudy(problem, declared, runs);
}

const codesOf = (given: Given) => studyOf(given).findings.map((finding) => finding.code);
/** A field with an error of order p that no relabelling of nodes or time explains. */
const ofOrder = (p: number) => (x: number, n: number) => exact(x) + Math.cos(2 * x + 1) * n ** -p;

describe("the studies of a submission", () => {
  it("are one for each norm at the nodes, the headline being relative L2", () => {
    const { study, studies } = studyOf({
      u: ofOrder(4),
      declaration: { claim: { kind: "algebraic", order: 4 } },
    });
    expect(studies.map(({ norm, measure }) => [norm, measure])).toEqual([
      ["relL2", "nodes"],
      ["relL1", "nodes"],
      ["relMax", "nodes"],
    ]);
    expect(study).toBe(studies[0]);
    expect(study.order).toBeCloseTo(4, 6);
    expect(study.verdict).toBe("confirmed");
    expect(study.gridConvergence?.trueError).not.toBeNull();
  });

  it("are twice as many where a reconstruction is declared", () => {
    const { studies } = studyOf({
      u: ofOrder(2),
      declaration: { reconstruction: { kind: "trigonometric" } },
    });
    expect(studies).toHaveLength(6);
    expect(studies[3].measure).toBe("between");
  });

  it("stand on absolute norms where the problem ranks on them", () => {
    const problem = steadyProblem({ ranksOnAbsoluteNorms: true });
    const { study } = studyOf({ problem, u: ofOrder(2) });
    expect(study.points[0].error).toBeCloseTo(Math.sqrt(Math.PI) * 16 ** -2, 6);
  });

  it("of a well-behaved submission bring nothing to light", () => {
    expect(codesOf({ u: ofOrder(4), problem: unsteadyStill(), ns: [16, 32, 64, 128] })).toEqual([]);
  });
});

/** exp(sin x) kept in time by an unsteady problem, so that shifts in time are looked for. */
function unsteadyStill(): ProblemDefinition {
  const problem = unsteadyProblem([1]);
  problem.exact = { kind: "expression", fields: { u: "exp(sin(x))*(1 + 0*t)" } };
  return problem;
}

describe("findings about a study", () => {
  it("name fewer than three grids and ratios below 1.1", () => {
    expect(codesOf({ u: ofOrder(2), ns: [16, 32] })).toEqual(["fewer-than-three-grids"]);
    expect(codesOf({ u: ofOrder(2), ns: [64, 68, 136] })).toEqual(["small-refinement-ratio"]);
  });

  it("name an error that rises above the floor, with both errors", () => {
    const { findings } = studyOf({
      u: (x, n) => exact(x) + (n === 32 ? 2e-3 : 1e-3) * Math.cos(2 * x + 1),
      ns: [16, 32, 64],
    });
    const [rise] = findings.filter(({ code }) => code === "error-not-falling");
    expect(rise.run).toEqual([32]);
    expect(Number(rise.figures.fine) / Number(rise.figures.coarse)).toBeCloseTo(2, 2);
  });

  it("name a stall with its level", () => {
    const given = {
      u: (x: number, n: number) => exact(x) + Math.cos(2 * x + 1) * (n ** -4 + 1e-6),
      ns: [16, 32, 64, 128, 256],
    };
    expect(codesOf(given)).toContain("stall");
  });

  it("name an order above the formal one over two pairs", () => {
    expect(codesOf({ u: ofOrder(4), declaration: { claim: { kind: "algebraic", order: 2 } } })).toContain(
      "order-above-formal",
    );
    expect(codesOf({ u: ofOrder(4), declaration: { claim: { kind: "algebraic", order: 4 } } })).toEqual([]);
  });

  it("name runs that equal the exact solution, and more strongly where their grid cannot carry it", () => {
    const equal = (ns: number[]) =>
      studyOf({ u: exact, ns }).findings.find(({ code }) => code === "equals-exact");
    expect(equal([4, 8, 16])?.severity).toBe("strong");
    expect(equal([32, 64, 128])?.severity).toBe("note");
    expect(codesOf({ u: (x, n) => exact(x) + (n > 16 ? 1e-5 : 0), ns: [16, 32, 64] })).not.toContain(
      "equals-exact",
    );
  });

  it("name a run that is a selection from another", () => {
    const fine = (x: number) => exact(x) + 1e-4 * Math.cos(3 * x + 1);
    expect(codesOf({ u: fine, ns: [16, 32, 64] })).toContain("subsampled");
    expect(codesOf({ u: fine, ns: [300, 600, 1200] })).toContain("subsampled");
    expect(codesOf({ u: ofOrder(2), ns: [16, 32, 64] })).not.toContain("subsampled");
  });

  it("do not take agreement at nodes with exact values, as on a boundary, for a selection", () => {
    const problem = boundedProblem("sin(pi*x)");
    const grid = { x: { kind: "uniform" as const, descending: false } };
    const runs = [5, 9, 17].map((n) => {
      const u = nodesOf("uniform", n, 0, 1).map(
        (x) => Math.sin(Math.PI * x) + Math.sin(4 * Math.PI * x) / n ** 2,
      );
      const run = declareRun([n]);
      return {
        declaration: run,
        score: scoreRun(problem, declare({ grid }), run, fileOf({ u: arrayOf(u) })),
      };
    });
    const { findings } = scoreStudy(problem, declare({ grid }), runs);
    expect(findings.map(({ code }) => code)).not.toContain("subsampled");
  });

  it("name a periodic grid that was filled with the end node included", () => {
    const given: Given = { u: (x, n) => exact((x * n) / (n - 1)) + n ** -4, ns: [16, 32, 64, 128] };
    expect(codesOf(given)).toContain("end-node-included");
  });

  it("name the share of the error that a time-step ladder shows, above 1 %", () => {
    const finer = (factor: number) => ({
      n: 64,
      u: (x: number) => exact(x) + Math.cos(2 * x + 1) * 64 ** -2 * factor,
      role: "timeStep" as const,
    });
    const { study, findings } = studyOf({ u: ofOrder(2), extra: [finer(0.9)] });
    expect(study.points).toHaveLength(3);
    expect(study.ladders[0].share).toBeCloseTo(0.1, 6);
    expect(findings.map(({ code }) => code)).toEqual(["non-spatial-error"]);
    expect(codesOf({ u: ofOrder(2), extra: [finer(0.995)] })).toEqual([]);
  });

  it("name a declared cost that falls by more than half", () => {
    const seconds: Record<number, number> = { 16: 1, 32: 4, 64: 1.5 };
    expect(codesOf({ u: ofOrder(2), runOf: (n) => ({ wallSeconds: seconds[n] }) })).toEqual(["cost-falls"]);
  });
});

describe("findings about a run", () => {
  it("name the time that the field is really at", () => {
    const problem = unsteadyProblem([1]);
    const late = (x: number, n: number) => Math.exp(Math.sin(x - 1.03)) + n ** -6;
    const found = studyOf({ problem, u: late }).findings.find(({ code }) => code === "wrong-time");
    expect(Number(found?.figures.shift)).toBeCloseTo(0.03, 5);
    const right = (x: number, n: number) => Math.exp(Math.sin(x - 1)) + Math.cos(3 * x) * n ** -2;
    expect(codesOf({ problem, u: right })).not.toContain("wrong-time");
  });

  it("name exchanged axes", () => {
    const axes = [
      { name: "x" as const, a: 0, b: 1, kind: "bounded" as const },
      { name: "y" as const, a: 0, b: 1, kind: "bounded" as const },
    ];
    const problem = boundedProblem("exp(x)*(1 + y^2)", { axes });
    const kind = { kind: "uniform" as const, descending: false };
    const declaration = declare({ grid: { x: kind, y: kind } });
    const score = (isExchanged: boolean) => {
      const runs = [9, 17, 33].map((n) => {
        const x = [...nodesOf("uniform", n, 0, 1)];
        const at = (p: number, q: number) => Math.exp(p) * (1 + q * q) + n ** -4;
        const u = x.flatMap((p) => x.map((q) => (isExchanged ? at(q, p) : at(p, q))));
        const run = declareRun([n, n]);
        return {
          declaration: run,
          score: scoreRun(problem, declaration, run, fileOf({ u: arrayOf(u, [n, n]) })),
        };
      });
      return scoreStudy(problem, declaration, runs).findings.map(({ code }) => code);
    };
    expect(score(true).filter((code) => code === "transposed")).toHaveLength(3);
    expect(score(false)).not.toContain("transposed");
  });

  it("name single precision and few digits, and do not mistake one for the other", () => {
    const single = studyOf({ u: (x, n) => Math.fround(ofOrder(2)(x, n)) });
    expect(new Set(single.findings.map(({ code }) => code))).toEqual(new Set(["precision"]));
    const rounded = studyOf({ u: (x, n) => Number(ofOrder(2)(x, n).toPrecision(5)) });
    const few = rounded.findings.filter(({ code }) => code === "few-digits");
    expect(few).toHaveLength(3);
    expect(few[0].figures.digits).toBe(5);
  });

  it("name coordinates that are off, a repeated end node and a descending file", () => {
    const problem = steadyProblem();
    const x = periodicNodes(16).map((value) => value + 1e-9);
    const withEnd = Float64Array.of(...x, 2 * Math.PI).reverse();
    const run = declareRun([16]);
    const score = scoreRun(
      problem,
      declare(),
      run,
      fileOf({ x: arrayOf(withEnd), u: arrayOf(withEnd.map(exact)) }),
    );
    const { findings } = scoreStudy(problem, declare(), [{ declaration: run, score }]);
    expect(findings.filter((finding) => finding.run !== null).map(({ code }) => code)).toEqual([
      "coordinates-off",
      "end-node-repeated",
      "descending-order",
    ]);
  });
});

describe("a score", () => {
  it("survives JSON unchanged", () => {
    const result = studyOf({ u: ofOrder(2), problem: unsteadyStill() });
    expect(JSON.parse(JSON.stringify(result))).toEqual(result);
  });
});
