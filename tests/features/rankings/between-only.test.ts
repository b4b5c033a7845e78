import { describe, expect, it } from "vitest";
import { whyBetweenOnly, type DecidingFinding } from "@/app/features/rankings/between-only";
import { studyOf } from "../../support/studies";

const equalsExact = (severity: "note" | "strong", grids: number): DecidingFinding => ({
  code: "equals-exact",
  severity,
  figures: { grids },
});

const study = studyOf([
  [8, 1e-3],
  [16, 1e-9],
  [32, 1e-16],
  [64, 1e-16],
]);

describe("a study ranks between the nodes only", () => {
  it("where it equals the exact solution on a grid that cannot carry it, or on every grid", () => {
    expect(whyBetweenOnly([equalsExact("strong", 2)], study)).toBe("exactAtNodes");
    expect(whyBetweenOnly([equalsExact("note", 4)], study)).toBe("exactAtNodes");
  });

  it("not where its finest grids, which resolve the solution, have come down to round-off", () => {
    expect(whyBetweenOnly([equalsExact("note", 2)], study)).toBeNull();
    expect(whyBetweenOnly([], study)).toBeNull();
  });

  it("where a listed grid has too wide a gap", () => {
    const wideGap: DecidingFinding = { code: "wide-gap", severity: "warning", figures: { gap: 5 } };
    expect(whyBetweenOnly([wideGap], study)).toBe("gapTooWide");
  });
});
