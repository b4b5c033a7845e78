import { describe, expect, it } from "vitest";

import { compileExpression, type ExpressionContext } from "@/benchmarks/expressions/compile-expression";
import { evaluateAtPoint, evaluateOnGrid } from "@/benchmarks/expressions/evaluate-on-grid";
import { quasiRandomPoints } from "@/benchmarks/problems/quasi-random";

const line: ExpressionContext = { axes: ["x"], scalars: ["t", "c"] };
const plane: ExpressionContext = { axes: ["x", "y"], scalars: ["t", "c"] };
const parameters = { c: 0.75 };
const t = 0.3;

const formulas: [text: string, value: (x: number, y: number) => number][] = [
  ["sin(x - c*t)", (x) => Math.sin(x - 0.75 * t)],
  ["exp(-x^2)*cos(y)", (x, y) => Math.exp(-x * x) * Math.cos(y)],
  ["tan(x)/cosh(y) + sech(x)", (x, y) => Math.tan(x) / Math.cosh(y) + 1 / Math.cosh(x)],
  ["asin(x/4) + acos(y/4) - atan(x*y)", (x, y) => Math.asin(x / 4) + Math.acos(y / 4) - Math.atan(x * y)],
  ["atan2(y, x)", (x, y) => Math.atan2(y, x)],
  ["sinh(x) - tanh(y)", (x, y) => Math.sinh(x) - Math.tanh(y)],
  ["log(2 + x^2)*sqrt(abs(y))", (x, y) => Math.log(2 + x * x) * Math.sqrt(Math.abs(y))],
  ["sign(x)*min(x, y, 1) + max(x, 2)", (x, y) => Math.sign(x) * Math.min(x, y, 1) + Math.max(x, 2)],
  ["mod(x, 1) + mod(y, c)", (x, y) => x - Math.floor(x) + y - 0.75 * Math.floor(y / 0.75)],
  ["x < y ? x : y*2", (x, y) => (x < y ? x : y * 2)],
  ["(x >= 0)*(y != 1) + (x <= y)", (x, y) => Number(x >= 0) * Number(y !== 1) + Number(x <= y)],
  ["-x^2 + 2^-y + x^3/7", (x, y) => -(x * x) + Math.pow(2, -y) + (x * x * x) / 7],
  ["(2 + x)^c - (3 + y)^0.5", (x, y) => Math.pow(2 + x, 0.75) - Math.sqrt(3 + y)],
  ["2*pi*x + e", (x) => 2 * Math.PI * x + Math.E],
  ["1/x", (x) => 1 / x],
  ["3", () => 3],
  ["y", (_, y) => y],
  ["x", (x) => x],
  ["c*t", () => 0.75 * t],
  ["x + y", (x, y) => x + y],
];

const axisX = Float64Array.from(quasiRandomPoints(37, 1), ([u]) => 3.9 * u - 1.9).sort();
const axisY = Float64Array.from(quasiRandomPoints(2100, 1), ([u]) => 3.7 * u - 1.8).sort();

describe("an expression has the values of its formula at every node", () => {
  it.each(formulas)("%s on a plane", (text, value) => {
    const { values } = evaluateOnGrid(compileExpression(text, plane), {
      coordinates: [axisX, axisY],
      t,
      parameters,
    });
    let worst = 0;
    axisX.forEach((x, i) =>
      axisY.forEach((y, j) => {
        const expected = value(x, y);
        worst = Math.max(
          worst,
          Math.abs(values[i * axisY.length + j] - expected) / Math.max(1, Math.abs(expected)),
        );
      }),
    );
    expect(worst).toBeLessThanOrEqual(4 * Number.EPSILON);
  });

  it("along a line longer than a block", () => {
    const compiled = compileExpression("exp(sin(x - c*t)) + x^2*(1 - x)", line);
    const { values } = evaluateOnGrid(compiled, { coordinates: [axisY], t, parameters });
    const expected = axisY.map((x) => Math.exp(Math.sin(x - 0.75 * t)) + x * x * (1 - x));
    const worst = values.reduce((most, value, j) => Math.max(most, Math.abs(value - expected[j])), 0);
    expect(worst).toBeLessThanOrEqual(8 * Number.EPSILON);
  });
});

describe("steps are carried out no more often than needed", () => {
  it("along one axis once for that axis, with the same values as without", () => {
    const hoisted = compileExpression("exp(sin(x))*cos(y) + t", plane);
    const everywhere = hoisted.operations.filter((operation) => operation.axes === 3);
    expect(everywhere.map((operation) => operation.name)).toEqual(["mul", "add"]);
    const { values } = evaluateOnGrid(hoisted, { coordinates: [axisX, axisY], t });
    const mixed = compileExpression("exp(sin(x + 0*y))*cos(y + 0*x) + t", plane);
    expect(evaluateOnGrid(mixed, { coordinates: [axisX, axisY], t }).values).toEqual(values);
  });

  it("equal parts once, and parts on numbers alone when compiling", () => {
    const compiled = compileExpression("sin(x)^2 + sin(x)^2*(2*pi/4)", line);
    expect(compiled.operations.filter((operation) => operation.name === "sin")).toHaveLength(1);
    expect(compiled.operations.some((operation) => operation.name === "div")).toBe(false);
  });
});

describe("complex expressions", () => {
  const complex = { ...line, isComplex: true };

  it.each([
    ["exp(i*x)", (x: number) => [Math.cos(x), Math.sin(x)]],
    ["(1 + i*x)/(2 - i)", (x: number) => [(2 - x) / 5, (1 + 2 * x) / 5]],
    ["(x + 2*i)^2", (x: number) => [x * x - 4, 4 * x]],
    ["conj(x + i)*abs(3 + 4*i)", (x: number) => [5 * x, -5]],
    ["sqrt(-4 + 0*i)*im(x + i)", () => [0, 2]],
    ["log(i)", () => [0, Math.PI / 2]],
    ["sin(i*x) - i*sinh(x)", () => [0, 0]],
    ["cosh(i*x) + cos(i*x) - re(x*i)", (x: number) => [Math.cos(x) + Math.cosh(x), 0]],
    ["x < 0 ? i : 1", (x: number) => (x < 0 ? [0, 1] : [1, 0])],
  ])("%s has its real and imaginary part", (text, value) => {
    const { values, imaginary } = evaluateOnGrid(compileExpression(text, complex), { coordinates: [axisX] });
    axisX.forEach((x, j) => {
      const [re, im] = value(x);
      expect(Math.abs(values[j] - re)).toBeLessThanOrEqual(16 * Number.EPSILON * Math.max(1, Math.abs(re)));
      expect(Math.abs((imaginary?.[j] ?? 0) - im)).toBeLessThanOrEqual(
        16 * Number.EPSILON * Math.max(1, Math.abs(im)),
      );
    });
  });
});

it("takes values of fields at every node", () => {
  const compiled = compileExpression("1 + u^2 + x", { ...line, fields: ["u"] });
  const u = Float64Array.of(1, 2, 3);
  const { values } = evaluateOnGrid(compiled, { coordinates: [Float64Array.of(0, 1, 2)], fields: { u } });
  expect([...values]).toEqual([2, 6, 12]);
});

it("writes into an output that the caller owns", () => {
  const out = new Float64Array(3);
  const compiled = compileExpression("2*x", line);
  const { values } = evaluateOnGrid(compiled, { coordinates: [Float64Array.of(1, 2, 3)] }, { values: out });
  expect(values).toBe(out);
  expect([...out]).toEqual([2, 4, 6]);
});

it("refuses a grid, an output or a parameter that does not fit", () => {
  const compiled = compileExpression("c*x", line);
  const x = Float64Array.of(1);
  expect(() => evaluateOnGrid(compiled, { coordinates: [x, x], parameters })).toThrow(RangeError);
  expect(() => evaluateOnGrid(compiled, { coordinates: [x] })).toThrow(/"c"/);
  expect(() =>
    evaluateOnGrid(compiled, { coordinates: [x], parameters }, { values: new Float64Array(2) }),
  ).toThrow(RangeError);
});

it("has the value at one point", () => {
  expect(evaluateAtPoint(compileExpression("c*x + y", plane), { x: 2, y: 1, c: 3 })).toBe(7);
});
