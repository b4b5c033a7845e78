import { describe, expect, it } from "vitest";
import { curvePoints, nodesForTolerance, type Reading } from "@/benchmarks/convergence/nodes-for-tolerance";
import { pointOf, studyOf } from "./make-study";

function reached(reading: Reading): Extract<Reading, { kind: "reached" }> {
  if (reading.kind !== "reached") throw new Error(`not reached: ${reading.reason}`);
  return reading;
}

describe("nodes for a tolerance", () => {
  it("lie on the straight line of a purely algebraic study, rounded up", () => {
    const study = studyOf([16, 32, 64, 128].map((n) => [n, 4 * n ** -2]));
    expect(reached(nodesForTolerance(study, 1e-3)).nodes).toBe(Math.ceil(Math.sqrt(4000)));
    expect(reached(nodesForTolerance(study, 4e-3)).nodes).toBe(32);
    expect(reached(nodesForTolerance(study, 4 * 64 ** -2))).toMatchObject({
      nodes: 64,
      errorAtReading: 4 * 64 ** -2,
    });
  });

  it("are read from the monotone cubic where the stretch has more than two runs", () => {
    // Hand value: ln s = 0, 1, 2 and ln E = 0, -1, -4 in natural units; slopes 0, -1.5, -4; at ln s = 1.5 the cubic is
    // -1/2 - 4/2 + (-1.5 + 4)/8 = -2.1875.
    const study = studyOf([
      [100, 1],
      [100 * Math.E, Math.exp(-1)],
      [100 * Math.E ** 2, Math.exp(-4)],
    ]);
    expect(reached(nodesForTolerance(study, Math.exp(-2.1875))).nodes).toBe(Math.ceil(100 * Math.exp(1.5)));
  });

  it("are at most the coarsest run's where that is below the tolerance already", () => {
    const study = studyOf([
      [8, 1e-3],
      [16, 1e-5],
    ]);
    expect(nodesForTolerance(study, 1e-2)).toMatchObject({ kind: "reached", nodes: 8, atMost: true });
  });

  it("belong to the run from which the error stays below: an early dip does not count", () => {
    const study = studyOf([
      [8, 1e-1],
      [16, 1e-6],
      [32, 1e-2],
      [64, 1e-4],
      [128, 1e-7],
    ]);
    const { nodes, errorAtReading } = reached(nodesForTolerance(study, 1e-5));
    expect(nodes).toBeGreaterThan(64);
    expect(nodes).toBeLessThanOrEqual(128);
    expect(errorAtReading).toBe(1e-7);
  });

  it("are not lost to round-off that grows with N: the walk of a floor starts at the smallest error", () => {
    const pairs: [number, number][] = [
      [8, 1e-2],
      [16, 1e-8],
      [32, 1e-15],
      [64, 4e-13],
      [128, 2e-12],
    ];
    const tail = { kind: "floor" as const, from: [32], level: 4e-13 };
    expect(nodesForTolerance(studyOf(pairs, tail), 1e-14)).toMatchObject({ kind: "reached" });
    expect(nodesForTolerance(studyOf(pairs), 1e-14)).toMatchObject({
      kind: "notReached",
      reason: "risesAgain",
      smallestError: 2e-12,
      at: [128],
    });
    expect(nodesForTolerance(studyOf(pairs, tail), 1e-16)).toMatchObject({
      reason: "floorAbove",
      smallestError: 1e-15,
      at: [32],
    });
  });

  it("are never extrapolated: the reason says where a study stops", () => {
    const pairs: [number, number][] = [
      [8, 1e-2],
      [16, 1e-3],
    ];
    expect(nodesForTolerance(studyOf(pairs), 1e-4)).toMatchObject({
      reason: "endsAbove",
      smallestError: 1e-3,
    });
    expect(nodesForTolerance(studyOf(pairs.slice(0, 1)), 1e-4)).toMatchObject({ reason: "singleRun" });
    const stall = { kind: "stall" as const, from: [16], level: 1e-3 };
    expect(nodesForTolerance(studyOf(pairs, stall), 1e-4)).toMatchObject({ reason: "stalls" });
    expect(() => nodesForTolerance(studyOf([]), 1e-4)).toThrow(RangeError);
    expect(() => nodesForTolerance(studyOf(pairs), 0)).toThrow(RangeError);
  });

  it("of a 2-D study scale each axis by one ratio of intervals, rounding each up", () => {
    const grid = (nx: number, ny: number, error: number) =>
      pointOf(nx * ny, error, {
        n: [nx, ny],
        axisIntervals: [nx, ny - 1],
        intervals: Math.sqrt(nx * (ny - 1)),
      });
    const study = { points: [grid(16, 9, 1e-2), grid(32, 17, 2.5e-3), grid(64, 33, 6.25e-4)], tail: null };
    const reading = reached(nodesForTolerance(study, 1e-3));
    const ratio = Math.sqrt(6.25e-4 / 1e-3);
    expect(reading.n).toEqual([Math.ceil(64 * ratio), Math.ceil(32 * ratio + 1)]);
    expect(reading.nodes).toBe(reading.n[0] * reading.n[1]);
  });

  it("fall, or stay, as the tolerance grows", () => {
    const study = studyOf([
      [8, 0.3],
      [12, 0.5],
      [20, 1e-2],
      [30, 8e-3],
      [60, 1e-6],
    ]);
    let before = Infinity;
    for (let k = 12; k >= 0; k--) {
      const reading = nodesForTolerance(study, 10 ** (-k / 2));
      if (reading.kind === "notReached") continue;
      expect(reading.nodes).toBeLessThanOrEqual(before);
      before = reading.nodes;
    }
    expect(before).toBe(8);
  });
});

describe("cost and unknowns for a tolerance", () => {
  const runs = (seconds: (n: number) => number | null, unknowns: (n: number) => number) => ({
    points: [16, 32, 64].map((n) => pointOf(n, n ** -2, { wallSeconds: seconds(n), unknowns: unknowns(n) })),
    tail: null,
  });

  it("are read on logarithmic axes as the nodes are", () => {
    const reading = reached(
      nodesForTolerance(
        runs(
          (n) => 1e-5 * n ** 3,
          (n) => 3 * n,
        ),
        40 ** -2,
      ),
    );
    expect(reading.cost).toBeCloseTo(0.64, 10);
    expect(reading.unknowns).toBe(120);
    expect(reading.nodes).toBe(40);
  });

  it("are null where a cost is missing or does not grow with n", () => {
    const missing = runs(
      (n) => (n === 32 ? null : n),
      (n) => n,
    );
    expect(reached(nodesForTolerance(missing, 40 ** -2)).cost).toBeNull();
    const falling = runs(
      (n) => 1 / n,
      (n) => n,
    );
    expect(reached(nodesForTolerance(falling, 40 ** -2)).cost).toBeNull();
  });
});

describe("the drawn curve", () => {
  const study = studyOf([
    [8, 1e-1],
    [16, 3e-2],
    [32, 5e-2],
    [64, 1e-5],
    [128, 1e-9],
  ]);

  it("passes through every run and ascends in nodes", () => {
    const curve = curvePoints(study, 100);
    for (const { n, error } of study.points) {
      expect(curve.some((p) => Math.abs(p.nodesPerAxis / n[0] - 1) < 1e-12 && p.error === error)).toBe(true);
    }
    for (let i = 1; i < curve.length; i++)
      expect(curve[i].nodesPerAxis).toBeGreaterThan(curve[i - 1].nodesPerAxis);
  });

  it("carries the reading: the error at the nodes read is the tolerance", () => {
    const curve = curvePoints(study, 4000);
    for (const tolerance of [1e-3, 1e-6, 1e-8]) {
      const { nodes } = reached(nodesForTolerance(study, tolerance));
      const below = curve.findIndex((p) => p.nodesPerAxis > 32 && p.error <= tolerance);
      expect(Math.ceil(curve[below].nodesPerAxis) - nodes).toBeLessThanOrEqual(1);
      expect(curve[below].nodesPerAxis).toBeGreaterThanOrEqual(nodes - 1);
    }
  });
});

describe("readings against dense truth", () => {
  /** Errors as functions of N, in closed form. */
  const bessel = (order: number) => {
    let sum = 0;
    let term = Array.from({ length: order }, (_, k) => 0.5 / (k + 1)).reduce((p, f) => p * f, 1);
    for (let m = 1; m < 30; m++) {
      sum += term;
      term *= 0.25 / (m * (m + order));
    }
    return sum;
  };
  const models: ((n: number) => number)[] = [
    // Heat equation by second-order differences, T = 0.1: the semi-discrete solution in closed form.
    (n) => Math.abs(Math.expm1((Math.PI ** 2 - 4 * n ** 2 * Math.sin(Math.PI / (2 * n)) ** 2) * 0.1)),
    // First derivative of sin 4x by fourth-order differences.
    (n) => {
      const h = (8 * Math.PI) / n;
      return Math.abs(1 - (8 * Math.sin(h) - Math.sin(2 * h)) / (6 * h));
    },
    // Fourier interpolation of exp(cos x): the first aliased coefficient.
    (n) => 2 * bessel(Math.ceil(n / 2)),
    // Geometric decay of a function with a pole at a distance.
    (n) => 1.5 ** -n,
    // Two ranges: an algebraic error beneath an exponential one.
    (n) => Math.exp(-n / 5) + 1e-2 * n ** -4,
  ];

  it("are within 2 % in the median and 11 % at the 90th percentile on ladders of ratio near 2", () => {
    const misses: number[] = [];
    for (const model of models) {
      for (const first of [6, 8, 10, 12]) {
        for (const ratio of [1.7, 2, 2.2]) {
          const ladder = Array.from({ length: 6 }, (_, k) => Math.round(first * ratio ** k));
          const runs = ladder
            .map((n): [number, number] => [n, model(n)])
            .filter(([, error]) => error > 1e-14);
          if (runs.length < 3) continue;
          for (let k = 3; k <= 26; k++) {
            const tolerance = 10 ** (-k / 2);
            const reading = nodesForTolerance(studyOf(runs), tolerance);
            if (reading.kind === "notReached" || reading.atMost) continue;
            let truth = runs[runs.length - 1][0];
            while (truth > 2 && model(truth - 1) <= tolerance) truth--;
            misses.push(Math.abs(reading.nodes / truth - 1));
          }
        }
      }
    }
    misses.sort((p, q) => p - q);
    expect(misses.length).toBeGreaterThan(300);
    expect(misses[misses.length >> 1]).toBeLessThanOrEqual(0.02);
    expect(misses[Math.floor(0.9 * misses.length)]).toBeLessThanOrEqual(0.11);
  });
});
