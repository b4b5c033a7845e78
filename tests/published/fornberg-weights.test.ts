import { describe, expect, it } from "vitest";

import { fornbergWeights } from "@/benchmarks/interpolation/fornberg-weights";

/**
 * B. Fornberg, Generation of finite difference formulas on arbitrarily spaced grids, Math. Comp. 51 (1988) 699-706,
 * tables of centred, one-sided and half-way weights (table contents stated from memory; each row was verified by its
 * exact moment conditions).
 */
const centred: [derivative: number, weights: number[]][] = [
  [1, [-1 / 2, 0, 1 / 2]],
  [1, [1 / 12, -2 / 3, 0, 2 / 3, -1 / 12]],
  [1, [-1 / 60, 3 / 20, -3 / 4, 0, 3 / 4, -3 / 20, 1 / 60]],
  [1, [1 / 280, -4 / 105, 1 / 5, -4 / 5, 0, 4 / 5, -1 / 5, 4 / 105, -1 / 280]],
  [2, [1, -2, 1]],
  [2, [-1 / 12, 4 / 3, -5 / 2, 4 / 3, -1 / 12]],
  [2, [1 / 90, -3 / 20, 3 / 2, -49 / 18, 3 / 2, -3 / 20, 1 / 90]],
  [2, [-1 / 560, 8 / 315, -1 / 5, 8 / 5, -205 / 72, 8 / 5, -1 / 5, 8 / 315, -1 / 560]],
  [3, [-1 / 2, 1, 0, -1, 1 / 2]],
  [3, [1 / 8, -1, 13 / 8, 0, -13 / 8, 1, -1 / 8]],
  [3, [-7 / 240, 3 / 10, -169 / 120, 61 / 30, 0, -61 / 30, 169 / 120, -3 / 10, 7 / 240]],
  [4, [1, -4, 6, -4, 1]],
  [4, [-1 / 6, 2, -13 / 2, 28 / 3, -13 / 2, 2, -1 / 6]],
  [4, [7 / 240, -2 / 5, 169 / 60, -122 / 15, 91 / 8, -122 / 15, 169 / 60, -2 / 5, 7 / 240]],
];

const oneSided: [derivative: number, weights: number[]][] = [
  [1, [-1, 1]],
  [1, [-3 / 2, 2, -1 / 2]],
  [1, [-11 / 6, 3, -3 / 2, 1 / 3]],
  [1, [-25 / 12, 4, -3, 4 / 3, -1 / 4]],
  [1, [-137 / 60, 5, -5, 10 / 3, -5 / 4, 1 / 5]],
  [1, [-49 / 20, 6, -15 / 2, 20 / 3, -15 / 4, 6 / 5, -1 / 6]],
  [2, [1, -2, 1]],
  [2, [2, -5, 4, -1]],
  [2, [35 / 12, -26 / 3, 19 / 2, -14 / 3, 11 / 12]],
  [2, [15 / 4, -77 / 6, 107 / 6, -13, 61 / 12, -5 / 6]],
  [2, [203 / 45, -87 / 5, 117 / 4, -254 / 9, 33 / 2, -27 / 5, 137 / 180]],
  [3, [-1, 3, -3, 1]],
  [3, [-5 / 2, 9, -12, 7, -3 / 2]],
];

const halfWay: [derivative: number, weights: number[]][] = [
  [0, [1 / 2, 1 / 2]],
  [0, [-1 / 16, 9 / 16, 9 / 16, -1 / 16]],
  [1, [-1, 1]],
  [1, [1 / 24, -9 / 8, 9 / 8, -1 / 24]],
  [1, [-3 / 640, 25 / 384, -75 / 64, 75 / 64, -25 / 384, 3 / 640]],
];

function expectWeights(found: Float64Array, expected: number[]) {
  const scale = Math.max(...expected.map(Math.abs));
  expected.forEach((weight, j) =>
    expect(Math.abs(found[j] - weight)).toBeLessThanOrEqual(20 * 2 ** -52 * scale),
  );
}

describe("weights of finite-difference formulas agree with Fornberg's tables", () => {
  it.each(centred)("derivative %i on centred nodes, weights %j", (derivative, expected) => {
    const reach = (expected.length - 1) / 2;
    expectWeights(
      fornbergWeights(
        derivative,
        0,
        expected.map((_, j) => j - reach),
      ),
      expected,
    );
  });

  it.each(oneSided)("derivative %i on nodes to one side, weights %j", (derivative, expected) => {
    expectWeights(
      fornbergWeights(
        derivative,
        0,
        expected.map((_, j) => j),
      ),
      expected,
    );
  });

  it.each(halfWay)("derivative %i half-way between nodes, weights %j", (derivative, expected) => {
    const shift = (expected.length - 1) / 2;
    expectWeights(
      fornbergWeights(
        derivative,
        0,
        expected.map((_, j) => j - shift),
      ),
      expected,
    );
  });
});

it("refuses a derivative on too few nodes", () => {
  expect(() => fornbergWeights(2, 0, [0, 1])).toThrow(RangeError);
});
