import { describe, expect, it } from "vitest";

import { compileExpression, parseInContext } from "@/benchmarks/expressions/compile-expression";
import { DataError } from "@/benchmarks/scoring/data-error";

const context = { axes: ["x", "y"], scalars: ["t", "nu"] };

function refusalOf(text: string, extra: object = {}): { code: string; where: string | null } {
  try {
    compileExpression(text, { ...context, ...extra });
  } catch (error) {
    if (error instanceof DataError) return { code: error.code, where: error.where };
    throw error;
  }
  throw new Error(`"${text}" was not refused`);
}

describe("an expression outside the allow-list is refused at its character", () => {
  it.each([
    ["", "expression/empty", "character 1"],
    ["x +", "expression/syntax", "character 4"],
    ["x + q", "expression/unknown-name", "character 5"],
    ["foo(x)", "expression/unknown-function", "character 1"],
    ["1 + x(2)", "expression/unknown-function", "character 5"],
    ["2x", "expression/syntax", "character 2"],
    ["x y", "expression/syntax", "character 3"],
    ["(x)(y)", "expression/syntax", "character 4"],
    ["sin x", "expression/syntax", "character 1"],
    ["sin + 1", "expression/syntax", "character 1"],
    ["1 + sin(x, y)", "expression/arguments", "character 5"],
    ["atan2(x)", "expression/arguments", "character 1"],
    ["x = 3", "expression/character", "character 3"],
    ["x.y", "expression/character", "character 2"],
    ['x["constructor"]', "expression/character", "character 2"],
    ["'text'", "expression/character", "character 1"],
    ["x; y", "expression/character", "character 2"],
    ["x\n+ y", "expression/character", "character 2"],
    ["x!", "expression/character", "character 2"],
    ["x'", "expression/character", "character 2"],
    ["x % 2", "expression/character", "character 3"],
    ["[x, y]", "expression/character", "character 1"],
    ["{a: 1}", "expression/character", "character 1"],
    ["x .* y", "expression/character", "character 3"],
    ["x # note", "expression/character", "character 3"],
    ["f(x) = x", "expression/character", "character 6"],
    ["x : y", "expression/not-allowed", null],
    ["x < y < 1", "expression/syntax", null],
    ["1e999", "expression/number", "character 1"],
    ["x + (y", "expression/syntax", "character 5"],
    ["x + y)", "expression/syntax", "character 6"],
    ["i*x", "expression/unknown-name", "character 1"],
    ["re(x)", "expression/unknown-function", "character 1"],
    ["d(x, x)", "expression/unknown-function", "character 1"],
    ["import(x)", "expression/unknown-function", "character 1"],
    ["true ? x : y", "expression/unknown-name", "character 1"],
    ["x in y", "expression/syntax", "character 3"],
    ["not x", "expression/unknown-name", "character 1"],
    ["min(x)", "expression/arguments", "character 1"],
  ])("%j", (text, code, where) => {
    const refusal = refusalOf(text);
    expect(refusal.code).toBe(code);
    if (where !== null) expect(refusal.where).toBe(where);
    expect(refusal.where).toMatch(/^character \d+$/);
  });

  it("names the named expression that a refusal lies in", () => {
    expect(refusalOf("2*f", { named: { f: "x + q" } })).toEqual({
      code: "expression/unknown-name",
      where: "character 5 of f",
    });
  });

  it("refuses named expressions that refer to each other in a circle", () => {
    expect(refusalOf("f", { named: { f: "g + 1", g: "2*f" } }).code).toBe("expression/circular");
  });

  it("refuses a declared name that a function or a constant has", () => {
    expect(refusalOf("x", { scalars: ["sin"] }).code).toBe("expression/reserved-name");
  });
});

describe("hostile expressions are refused before the parser sees them", () => {
  const repeat = (text: string, count: number) => text.repeat(count);

  it.each([
    ["parentheses", `${repeat("(", 400)}x${repeat(")", 400)}`],
    ["function calls", `${repeat("sin(", 65)}x${repeat(")", 65)}`],
    ["signs", `${repeat("-", 1500)}x`],
    ["powers", `${repeat("x^", 900)}x`],
    ["conditions", `${repeat("x?x:", 400)}x`],
    ["conditions within conditions", `${repeat("x?", 300)}x${repeat(":x", 300)}`],
    ["signs within powers", `${repeat("2^-", 300)}x`],
  ])("deep nesting of %s", (_, text) => {
    expect(refusalOf(text).code).toBe("expression/too-deep");
  });

  it("reads at most 2,000 characters", () => {
    const sum = Array.from({ length: 1000 }, () => "x").join("+");
    expect(sum.length).toBe(1999);
    expect(() => compileExpression(sum, context)).not.toThrow();
    expect(refusalOf(`${sum}+x`)).toEqual({ code: "expression/too-long", where: "character 2001" });
  });

  it("carries out whole powers without letting the list of steps grow with the exponent", () => {
    expect(compileExpression("x^32", context).operations.length).toBeLessThan(12);
    expect(compileExpression("x^1000000", context).operations.length).toBeLessThan(5);
  });
});

it("nests 64 levels deep", () => {
  expect(() => parseInContext(`${"(".repeat(64)}x${")".repeat(64)}`, context)).not.toThrow();
});
