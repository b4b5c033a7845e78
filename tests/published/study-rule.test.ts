import { describe, expect, it } from "vitest";
import { judgeClaim } from "@/benchmarks/convergence/judge-claim";
import { judgeStudy, workingPrecision } from "@/benchmarks/convergence/judge-study";
import series from "../fixtures/study-series.json";

// Source: the labelled series that came with the reference implementation of the rule (NumPy): real errors of
// difference, compact, Fourier, Chebyshev, Legendre and spline discretisations. E is given to nine digits, the order to six.

const tailNames: Record<string, string> = {
  floor: "floor",
  stall: "stall",
  "floor or stall": "floorOrStall",
  short: "short",
};

describe("the rule that judges a refinement study", () => {
  it("agrees with the reference implementation on the kind, order and tail of all 713 series", () => {
    expect(series).toHaveLength(713);
    for (const one of series) {
      const s = one.n.map((n) => (one.grid === "bounded" ? n - 1 : n));
      const eps = one.precision === 32 ? workingPrecision.float32 : workingPrecision.float64;
      const got = judgeStudy(s, one.E, eps, one.formal);
      const tail = one.expected.tail
        ? { start: one.expected.tail[0], kind: tailNames[String(one.expected.tail[1])] }
        : null;
      expect({ id: one.id, kind: got.kind, tail: got.tail }).toEqual({
        id: one.id,
        kind: one.expected.kind,
        tail,
      });
      if (one.expected.order === null) expect(got.order).toBeNull();
      else expect(Math.abs((got.order ?? NaN) / one.expected.order - 1), one.id).toBeLessThan(6e-6);
    }
  });

  it("agrees with the reference implementation on the verdict of every series with a claim", () => {
    let judged = 0;
    for (const one of series) {
      if (one.expected.verdict === null) continue;
      judged++;
      const s = one.n.map((n) => (one.grid === "bounded" ? n - 1 : n));
      const eps = one.precision === 32 ? workingPrecision.float32 : workingPrecision.float64;
      const claim =
        one.formal === null
          ? ({ kind: "exponential" } as const)
          : ({ kind: "algebraic", order: one.formal } as const);
      expect([one.id, judgeClaim(s, one.E, eps, claim)]).toEqual([one.id, one.expected.verdict]);
    }
    expect(judged).toBeGreaterThan(300);
  });
});
