import katex from "katex";
import { describe, expect, it } from "vitest";

import { shippedProblem, shippedProblems } from "@/benchmarks/problems/catalogue";
import { evaluateExact } from "@/benchmarks/problems/exact-solution";
import { typesetProblem } from "@/benchmarks/problems/typeset";

const problems = shippedProblems.map((problem) => [problem.slug, problem] as const);

it("holds each problem under one slug and one code", () => {
  const slugs = shippedProblems.map(({ slug }) => slug);
  expect(slugs).toEqual(
    expect.arrayContaining([
      "advection-exp-sine",
      "advection-diffusion-gaussian",
      "burgers-periodic",
      "nonlinear-diffusivity",
      "helmholtz-periodic-2d",
      "heat-dirichlet",
      "heat-neumann-robin",
      "boundary-layer",
      "poisson-mixed-2d",
    ]),
  );
  expect(new Set(slugs).size).toBe(slugs.length);
  expect(new Set(shippedProblems.map(({ code }) => code)).size).toBe(slugs.length);
});

it("refuses a slug that it does not hold", () => {
  expect(() => shippedProblem("no-such-problem")).toThrow(/no-such-problem/);
});

describe.each(problems)("%s", (_, problem) => {
  // The values were computed in 50-digit arithmetic for the project's reference catalogue.
  it("has the listed check values", () => {
    expect(problem.checkValues.length).toBeGreaterThanOrEqual(3);
    for (const { field, at, value, imaginary } of problem.checkValues) {
      const coordinates = problem.axes.map(({ name }) => Float64Array.of(at[name] ?? NaN));
      const found = evaluateExact(problem, field, at.t ?? null, coordinates);
      const size = Math.hypot(value, imaginary ?? 0);
      expect(Math.abs(found.values[0] - value)).toBeLessThanOrEqual(1e-13 * size);
      if (imaginary !== undefined) {
        expect(Math.abs((found.imaginary?.[0] ?? NaN) - imaginary)).toBeLessThanOrEqual(1e-13 * size);
      }
    }
  });

  it("is classified as its axes and times say", () => {
    const { classification, axes, outputTimes, boundaryConditions } = problem;
    const isBounded = axes.some(({ kind }) => kind === "bounded");
    expect(classification.domain).toBe(isBounded ? "bounded" : "periodic");
    expect(problem.code).toMatch(isBounded ? /^[BR]-\d\d$/ : /^P-\d\d$/);
    expect(classification.dimension).toBe(axes.length);
    expect(classification.isSteady).toBe(outputTimes.length === 0);
    expect(problem.grids.kinds).toHaveLength(axes.length);
    const ends = axes
      .filter(({ kind }) => kind === "bounded")
      .flatMap(({ name }) => [`${name}a`, `${name}b`]);
    expect(boundaryConditions.map(({ axis, end }) => `${axis}${end}`).sort()).toEqual(ends);
  });

  it("suggests only grids that it allows", () => {
    for (const kind of Object.keys(problem.grids.suggested)) {
      problem.grids.kinds.forEach((allowed) => expect(allowed).toContain(kind));
    }
  });

  it("is typeset in LaTeX that KaTeX accepts", () => {
    const formulas = Object.values(typesetProblem(problem)).flat();
    expect(formulas.length).toBeGreaterThan(2);
    for (const formula of formulas) {
      expect(() => katex.renderToString(formula, { throwOnError: true, strict: "error" })).not.toThrow();
    }
  });
});

describe("formulas are written in the notation of the trade", () => {
  it.each([
    ["advection-diffusion-gaussian", ["u_t + c\\,u_x = \\nu\\,u_{xx}"]],
    ["burgers-periodic", ["u_t + \\left(\\frac{u^{2}}{2}\\right)_x = \\nu\\,u_{xx}"]],
    ["nonlinear-diffusivity", ["u_t = (k\\,u_x)_x + f"]],
    ["boundary-layer", ["-\\varepsilon\\,u_{xx} + u_x = 1"]],
  ])("%s", (slug, equations) => {
    expect(typesetProblem(shippedProblem(slug)).equations).toEqual(equations);
  });

  it("with the conditions at each end", () => {
    expect(typesetProblem(shippedProblem("heat-neumann-robin")).boundary).toEqual([
      "u_x(0, t) = 0",
      "\\mathrm{Bi}\\,u(1, t) + u_x(1, t) = 0",
    ]);
  });
});

it("asks for the time of an unsteady problem and for a field that it has", () => {
  const problem = shippedProblem("heat-dirichlet");
  expect(() => evaluateExact(problem, "u", null, [Float64Array.of(0.5)])).toThrow(/time/);
  expect(() => evaluateExact(problem, "v", 0, [Float64Array.of(0.5)])).toThrow(/"v"/);
});
