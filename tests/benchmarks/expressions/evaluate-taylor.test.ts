import { describe, expect, it } from "vitest";

import { compileExpression, compileTrees, parseInContext } from "@/benchmarks/expressions/compile-expression";
import { evaluateTaylor } from "@/benchmarks/expressions/evaluate-taylor";
import { TaylorSpace } from "@/benchmarks/expressions/taylor-space";

const context = { axes: ["x", "y"], scalars: ["t"], derivatives: ["x", "y", "t"] };
const place: Record<string, number> = { x: 0.4, y: -0.7, t: 0.3 };
const space = new TaylorSpace(["x", "y", "t"], 4);

function valueOf(text: string): number {
  const compiled = compileExpression(text, context);
  return evaluateTaylor(compiled, space, (name) => space.variable(name, place[name]))[0].re[0];
}

const { x, y, t } = place;

describe("derivatives by Taylor arithmetic are those of the calculus", () => {
  it.each([
    ["d(sin(x), x)", Math.cos(x)],
    ["d(d(d(d(cos(x*t), x), x), x), x)", t ** 4 * Math.cos(x * t)],
    ["d(d(exp(x*y), x), y)", (1 + x * y) * Math.exp(x * y)],
    ["d(tan(x), x)", 1 + Math.tan(x) ** 2],
    ["d(d(tanh(x), x), x)", -2 * Math.tanh(x) * (1 - Math.tanh(x) ** 2)],
    ["d(asin(x), x)", 1 / Math.sqrt(1 - x * x)],
    ["d(d(asin(x), x), x)", x / (1 - x * x) ** 1.5],
    ["d(acos(x), x)", -1 / Math.sqrt(1 - x * x)],
    ["d(d(atan(x), x), x)", (-2 * x) / (1 + x * x) ** 2],
    ["d(atan2(y, x), x)", -y / (x * x + y * y)],
    ["d(atan2(x, y), x)", y / (x * x + y * y)],
    ["d(sinh(x)*cosh(x), x)", Math.cosh(2 * x)],
    ["d(sech(x), x)", -Math.tanh(x) / Math.cosh(x)],
    ["d(log(x), x)", 1 / x],
    ["d(d(sqrt(x), x), x)", -0.25 * x ** -1.5],
    ["d(x^t, x)", t * x ** (t - 1)],
    ["d(x^t, t)", Math.log(x) * x ** t],
    ["d(abs(y)^3, y)", -3 * y * y],
    ["d(sign(y)*y, y)", -1],
    ["d(erf(x), x)", (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x)],
    ["d(d(erfc(x), x), x)", ((4 * x) / Math.sqrt(Math.PI)) * Math.exp(-x * x)],
    ["d(mod(y, 1)^2, y)", 2 * (y + 1)],
    ["d(min(x, y)*max(x, t), x)", y],
    ["d(x < y ? x : x^3, x)", 3 * x * x],
    ["d(x/(1 + y*t), t)", (-x * y) / (1 + y * t) ** 2],
    ["d(d(d(x^2*y*t^3, x), y), t)", 2 * x * 3 * t * t],
  ])("%s", (text, expected) => {
    expect(Math.abs(valueOf(text) - expected)).toBeLessThanOrEqual(
      64 * Number.EPSILON * Math.max(1, Math.abs(expected)),
    );
  });
});

it("differentiates several expressions that share their parts", () => {
  const trees = ["d(u, x)", "d(d(u, x), t)"].map((text) =>
    parseInContext(text, { ...context, named: { u: "sin(x*t)" } }),
  );
  const compiled = compileTrees(trees, { ...context, named: { u: "sin(x*t)" } });
  const [slope, mixed] = evaluateTaylor(compiled, space, (name) => space.variable(name, place[name]));
  expect(slope.re[0]).toBeCloseTo(t * Math.cos(x * t), 14);
  expect(mixed.re[0]).toBeCloseTo(Math.cos(x * t) - x * t * Math.sin(x * t), 14);
});

it("refuses a derivative along something that is no axis", () => {
  expect(() => compileExpression("d(x, 2)", context)).toThrow(/differentiates along x, y, t/);
});

it("refuses an order that it does not carry", () => {
  expect(() => new TaylorSpace(["x"], 9)).toThrow(RangeError);
});
