import { describe, expect, it } from "vitest";
import { workingPrecision } from "@/benchmarks/convergence/judge-study";
import { assembleStudy, type StudySettings } from "@/benchmarks/convergence/refinement-study";
import type { StudyPoint } from "@/benchmarks/scoring/result";
import { pointOf } from "./make-study";

const settings: StudySettings = {
  norm: "relL2",
  measure: "nodes",
  eps: workingPrecision.float64,
  claim: { kind: "algebraic", order: 2 },
  length: 2,
};

const algebraic = (order: number, ns = [16, 32, 64, 128]) => ns.map((n) => pointOf(n, 3 * (2 / n) ** order));

describe("a refinement study", () => {
  it("of an algebraic error shows its order, interval, verdict and leading coefficient", () => {
    const study = assembleStudy(algebraic(2), settings);
    expect(study.kind).toBe("algebraic");
    expect(study.order).toBeCloseTo(2, 12);
    expect(study.pairOrders).toHaveLength(3);
    const [least, most] = study.orderInterval ?? [NaN, NaN];
    expect(least).toBeCloseTo(2, 12);
    expect(most).toBeCloseTo(2, 12);
    expect(study.verdict).toBe("confirmed");
    expect(study.leadingCoefficient).toBeCloseTo(3, 12);
    expect(study.rate).toBeNull();
  });

  it("sorts its runs, whatever their order", () => {
    const [a, b, c, d] = algebraic(2);
    expect(assembleStudy([c, a, d, b], settings)).toEqual(assembleStudy([a, b, c, d], settings));
  });

  it("says below or above where the order settles away from the claim", () => {
    expect(assembleStudy(algebraic(2), { ...settings, claim: { kind: "algebraic", order: 4 } }).verdict).toBe(
      "below",
    );
    expect(assembleStudy(algebraic(4), settings).verdict).toBe("above");
  });

  it("of an exponential error shows the rate per node, by nodes and not by intervals", () => {
    const points = [8, 10, 12, 14, 16, 18, 20].map((n) =>
      pointOf(n, Math.exp(-1.2 * n), { intervals: n - 1, axisIntervals: [n - 1] }),
    );
    const study = assembleStudy(points, { ...settings, claim: { kind: "exponential" } });
    expect([study.kind, study.verdict]).toEqual(["exponential", "confirmed"]);
    expect(study.rate).toBeCloseTo(1.2, 12);
  });

  it("names the run from which the error stalls, and its level", () => {
    const points = [16, 32, 64, 128, 256, 512].map((n) => pointOf(n, 3 / n ** 4 + 1e-6));
    const study = assembleStudy(points, { ...settings, claim: { kind: "algebraic", order: 4 } });
    expect(study.tail?.kind).toBe("stall");
    expect(study.tail?.level).toBeCloseTo(1e-6, 7);
    expect(study.leadingCoefficient).not.toBeNull();
  });

  it("quotes no order where the axes are refined apart", () => {
    const grid = (nx: number, ny: number, error: number): StudyPoint =>
      pointOf(nx * ny, error, { n: [nx, ny], axisIntervals: [nx, ny], intervals: Math.sqrt(nx * ny) });
    const apart = assembleStudy([grid(16, 16, 4e-2), grid(32, 16, 2e-2), grid(64, 32, 5e-3)], settings);
    expect(apart).toMatchObject({ kind: "undecided", order: null, verdict: "undecidable", pairOrders: [] });
    const alike = assembleStudy([grid(16, 8, 4e-2), grid(32, 16, 1e-2), grid(64, 32, 2.5e-3)], settings);
    expect(alike.order).toBeCloseTo(2, 12);
  });

  it("keeps marks at 10^(-k/2) as far as it reaches", () => {
    const { marks } = assembleStudy(algebraic(2), settings);
    expect(marks[0]).toEqual({ tolerance: 1, nodes: 16, atMost: true });
    expect(marks.every(({ tolerance }) => tolerance >= 3 * (2 / 128) ** 2)).toBe(true);
    expect(marks.at(-1)?.nodes).toBeLessThanOrEqual(128);
    expect(marks).toHaveLength(7);
  });

  it("of one run, or of none, has no kind and proves nothing", () => {
    expect(assembleStudy([], settings)).toMatchObject({ kind: "none", verdict: "undecidable", marks: [] });
    expect(assembleStudy(algebraic(2).slice(0, 1), settings)).toMatchObject({ kind: "none", order: null });
    expect(assembleStudy(algebraic(2), { ...settings, claim: { kind: "none" } }).verdict).toBe("none");
  });

  it("is unchanged when the unit of length changes, but for the leading coefficient", () => {
    const study = assembleStudy(algebraic(2), settings);
    const scaled = assembleStudy(algebraic(2), { ...settings, length: 20 });
    expect({ ...scaled, leadingCoefficient: 0 }).toEqual({ ...study, leadingCoefficient: 0 });
    expect((study.leadingCoefficient ?? 0) / (scaled.leadingCoefficient ?? 1)).toBeCloseTo(100, 9);
  });
});
