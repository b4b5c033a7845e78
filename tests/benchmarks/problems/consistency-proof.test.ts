import { describe, expect, it } from "vitest";

import { shippedProblem, shippedProblems } from "@/benchmarks/problems/catalogue";
import { proveConsistency } from "@/benchmarks/problems/consistency-proof";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import { DataError } from "@/benchmarks/scoring/data-error";

const problems = shippedProblems.map((problem) => [problem.slug, problem] as const);

describe.each(problems)("the exact solution of %s", (_, problem) => {
  const proof = proveConsistency(problem);

  it("fits its equations and conditions within every limit", () => {
    expect(proof.checks.filter((check) => !check.holds)).toEqual([]);
    expect(proof.holds).toBe(true);
  });

  it("is checked in each equation, condition, periodic axis and suggested grid", () => {
    const count = (what: string) => proof.checks.filter((check) => check.what === what).length;
    expect(count("equation")).toBe(problem.equations.length * (1 + problem.kinks.length));
    expect(count("initial")).toBe(problem.initialConditions.length);
    expect(count("boundary")).toBe(problem.boundaryConditions.length);
    const isSmooth = ["entire", "analytic"].includes(problem.classification.smoothness.kind);
    const periodicAxes = problem.axes.filter(({ kind }) => kind === "periodic");
    expect(count("periodicity")).toBe(isSmooth ? periodicAxes.length : 0);
    expect(count("evaluation")).toBe(1);
  });
});

type Change = (problem: ProblemDefinition) => void;

const identity =
  (text: string): Change =>
  (problem) => {
    problem.equations[0].identity = text;
  };
const initial =
  (text: string): Change =>
  (problem) => {
    problem.initialConditions[0].expression = text;
  };
const data =
  (index: number, g: string): Change =>
  (problem) => {
    problem.boundaryConditions[index].g = g;
  };
const solution =
  (text: string): Change =>
  (problem) => {
    problem.exact = { kind: "expression", fields: { u: text } };
  };
const named =
  (name: string, from: string, to: string): Change =>
  (problem) => {
    const found = problem.expressions.find((candidate) => candidate.name === name);
    if (!found?.expression.includes(from)) throw new Error(`${name} does not hold ${from}`);
    found.expression = found.expression.replace(from, to);
  };

describe("a definition with a mistake is rejected, by the check that it concerns", () => {
  it.each<[slug: string, mistake: string, what: string, change: Change]>([
    ["advection-exp-sine", "a sign", "equation", identity("u_t - c*u_x = 0")],
    ["advection-exp-sine", "a coefficient by 1e-3", "equation", identity("u_t + 1.001*c*u_x = 0")],
    ["advection-exp-sine", "another start", "initial", initial("exp(sin(x)) + 1e-9")],
    [
      "advection-exp-sine",
      "a solution that is not periodic",
      "periodicity",
      solution("exp(sin(1.001*(x - c*t)))"),
    ],
    [
      "advection-diffusion-gaussian",
      "a coefficient by 1e-3",
      "equation",
      identity("u_t + c*u_x = 1.001*nu*u_xx"),
    ],
    ["advection-diffusion-gaussian", "another width", "initial", initial("exp(-(x - 1/2)^2/(2.001*s0^2))")],
    ["burgers-periodic", "a missing factor", "equation", identity("u_t + d(u^2, x) = nu*u_xx")],
    ["burgers-periodic", "a coefficient by 1e-3", "equation", identity("u_t + d(u^2/2, x) = 0.999*nu*u_xx")],
    ["nonlinear-diffusivity", "a sign in the source", "equation", named("f", "-w/2 +", "w/2 +")],
    ["nonlinear-diffusivity", "a coefficient by 1e-3", "equation", named("k", "u^2", "1.001*u^2")],
    ["helmholtz-periodic-2d", "a sign", "equation", identity("-u_xx + u_yy + kappa*u = f")],
    ["helmholtz-periodic-2d", "a coefficient by 1e-3", "equation", named("f", "kappa", "1.001*kappa")],
    ["heat-dirichlet", "a coefficient by 1e-3", "equation", identity("u_t = 1.001*u_xx")],
    ["heat-dirichlet", "a boundary value", "boundary", data(1, "1e-6")],
    ["heat-neumann-robin", "a boundary value", "boundary", data(0, "1e-6")],
    [
      "heat-neumann-robin",
      "a sign at an end",
      "boundary",
      (problem) => {
        problem.boundaryConditions[1].alpha = "-Bi";
      },
    ],
    [
      "heat-neumann-robin",
      "a parameter by 1e-3",
      "boundary",
      (problem) => {
        problem.parameters[1].value *= 1.001;
      },
    ],
    ["boundary-layer", "a coefficient by 1e-3", "equation", identity("-eps*u_xx + 1.001*u_x = 1")],
    ["boundary-layer", "a boundary value", "boundary", data(0, "t0")],
    ["advection-square-wave", "a wrong speed of its jumps", "equation", identity("u_t + 1.001*c*u_x = 0")],
    ["diffusivity-jump", "a flux that jumps", "equation", named("k", "k2", "1.001*k2")],
    ["porous-medium-3", "a coefficient by 1e-3", "equation", identity("u_t = 1.001*d(d(u^3, x), x)")],
    [
      "plucked-string",
      "a kink that leaves the domain",
      "equation",
      (problem) => {
        problem.kinks[0] = "2 + t";
      },
    ],
    ["poisson-mixed-2d", "a sign", "equation", identity("-u_xx + u_yy = f")],
    ["poisson-mixed-2d", "a boundary value", "boundary", data(3, "x/1000")],
    [
      "poisson-mixed-2d",
      "a solution with a hole",
      "evaluation",
      solution("cos(pi*x)*sin(pi*y)*(y == 1 ? 1/(1-y) : 1)"),
    ],
  ])("%s with %s", (slug, _, what, change) => {
    const problem = structuredClone(shippedProblem(slug));
    problem.parameters.push({ name: "t0", value: 1e-6, unit: "dimensionless", meaning: "a disturbance" });
    change(problem);
    const proof = proveConsistency(problem);
    expect(proof.holds).toBe(false);
    expect(proof.checks.filter((check) => !check.holds).map((check) => check.what)).toContain(what);
  });

  it("names where the largest defect is", () => {
    const problem = structuredClone(shippedProblem("heat-dirichlet"));
    problem.boundaryConditions[1].g = "t";
    const failed = proveConsistency(problem).checks.find((check) => !check.holds);
    expect(failed?.at?.x).toBe(1);
    expect(failed?.at?.t).toBeGreaterThan(0.09);
  });
});

describe("an equation that cannot be read is refused at its character", () => {
  it.each([
    ["u_t + c*u_x", "expression/identity", "character 12"],
    ["u_t = c = u_x", "expression/identity", "character 9"],
    ["u_t + c*u_q = 0", "expression/unknown-name", "character 9"],
    ["u_t + c*u_y = 0", "expression/unknown-name", "character 9"],
    ["u_t = -c*v_x", "expression/unknown-name", "character 10"],
    ["u_t = d(u, z)", "expression/unknown-name", "character 12"],
  ])("%s", (text, code, where) => {
    const problem = structuredClone(shippedProblem("advection-exp-sine"));
    problem.equations[0].identity = text;
    try {
      proveConsistency(problem);
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(DataError);
      expect(error).toMatchObject({ code, where });
    }
  });
});
