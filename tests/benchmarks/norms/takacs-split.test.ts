import { describe, expect, it } from "vitest";
import { takacsSplit } from "@/benchmarks/norms/takacs-split";

const n = 128;
const grid = Float64Array.from({ length: n }, (_, j) => (2 * Math.PI * j) / n);
const exact = grid.map((x) => Math.exp(Math.sin(x)));

function split(u: Float64Array) {
  const parts = takacsSplit(u, exact);
  if (!parts) throw new Error("the split is undefined");
  return parts;
}

describe("Takacs' split of the mean-square error", () => {
  it("adds up to the mean-square error to 1e-12 at shifts down to 1e-9", () => {
    for (let shift = 1; shift >= 1e-9; shift /= 10) {
      for (const amplitude of [1, 1 + shift, 1 - shift / 3]) {
        const { dissipation, dispersion, meanSquare } = split(
          grid.map((x) => amplitude * Math.exp(Math.sin(x - shift))),
        );
        expect(Math.abs((dissipation + dispersion) / meanSquare - 1)).toBeLessThanOrEqual(1e-12);
      }
    }
  });

  it("calls a shifted wave pure dispersion and a damped one pure dissipation", () => {
    const shifted = split(grid.map((x) => Math.exp(Math.sin(x - 1e-4))));
    expect(shifted.dissipation).toBeLessThanOrEqual(1e-12 * shifted.dispersion);
    const damped = split(exact.map((value) => 0.999 * value));
    expect(damped.dispersion).toBeLessThanOrEqual(1e-12 * damped.dissipation);
  });

  it("equals the published form where that loses no digits", () => {
    const u = grid.map((x) => 0.9 * Math.exp(Math.sin(x - 0.7)) + 0.05);
    const mean = (values: Float64Array) => values.reduce((sum, v) => sum + v, 0) / n;
    const [meanU, meanExact] = [mean(u), mean(exact)];
    const sigmaU = Math.sqrt(mean(u.map((v) => (v - meanU) ** 2)));
    const sigmaExact = Math.sqrt(mean(exact.map((v) => (v - meanExact) ** 2)));
    const rho = mean(u.map((v, j) => (v - meanU) * (exact[j] - meanExact))) / (sigmaU * sigmaExact);
    const { dissipation, dispersion } = split(u);
    expect(dissipation).toBeCloseTo((sigmaU - sigmaExact) ** 2 + (meanU - meanExact) ** 2, 14);
    expect(dispersion).toBeCloseTo(2 * (1 - rho) * sigmaU * sigmaExact, 14);
  });

  it("is undefined where a field is constant", () => {
    expect(takacsSplit(new Float64Array(n).fill(1), exact)).toBeNull();
    expect(takacsSplit(exact, new Float64Array(n))).toBeNull();
  });
});
