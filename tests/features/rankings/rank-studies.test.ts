import { describe, expect, it } from "vitest";
import { rankStudies, type Candidate } from "@/app/features/rankings/rank-studies";
import { studyOf } from "../../support/studies";

/** A candidate whose study reaches E = errors[k] at nodes[k], one axis, periodic. */
function candidate(
  submissionId: string,
  runs: [nodes: number, error: number, seconds?: number][],
  day = 1,
): Candidate {
  return { submissionId, handedInAt: new Date(Date.UTC(2026, 0, day)), study: studyOf(runs), barredBy: null };
}

const ranksOf = (candidates: Candidate[], tolerance: number) =>
  rankStudies(candidates, tolerance, "nodes").reached.map((row) => [
    row.candidate.submissionId,
    row.rank,
    row.isTied,
  ]);

describe("ranking at a tolerance", () => {
  it("orders by the nodes that the tolerance costs, whatever the order of the candidates", () => {
    const coarse = candidate("coarse", [[16, 1e-4]]);
    const fine = candidate("fine", [[32, 1e-4]]);
    const finest = candidate("finest", [[64, 1e-4]]);
    for (const candidates of [
      [coarse, fine, finest],
      [finest, coarse, fine],
    ]) {
      expect(ranksOf(candidates, 1e-3)).toEqual([
        ["coarse", 1, false],
        ["fine", 2, false],
        ["finest", 3, false],
      ]);
    }
  });

  it("gives equal nodes the same rank and leaves the next ranks out: 1=, 1=, 3", () => {
    const candidates = [
      candidate("c", [[32, 1e-5]]),
      candidate("a", [[16, 2e-5]]),
      candidate("b", [[16, 1e-5]]),
    ];
    expect(ranksOf(candidates, 1e-3)).toEqual([
      ["b", 1, true],
      ["a", 1, true],
      ["c", 3, false],
    ]);
  });

  it("puts the earlier hand-in first where nodes and error are equal", () => {
    const candidates = [candidate("late", [[16, 1e-5]], 9), candidate("early", [[16, 1e-5]], 2)];
    expect(ranksOf(candidates, 1e-3).map(([id]) => id)).toEqual(["early", "late"]);
  });

  it("lists what does not reach the tolerance by the error it stops at", () => {
    const candidates = [
      candidate("far", [[16, 1e-2]]),
      candidate("near", [[16, 1e-4]]),
      candidate("in", [[16, 1e-7]]),
    ];
    const { reached, notReached } = rankStudies(candidates, 1e-6, "nodes");
    expect(reached.map((row) => row.candidate.submissionId)).toEqual(["in"]);
    expect(notReached.map((row) => [row.candidate.submissionId, row.smallestError, row.at])).toEqual([
      ["near", 1e-4, [16]],
      ["far", 1e-2, [16]],
    ]);
  });

  it("ranks by declared cost, and names what declares none instead of ranking it", () => {
    const candidates = [
      candidate("slow", [[8, 1e-4, 5]]),
      candidate("fast", [[64, 1e-4, 1]]),
      candidate("silent", [[4, 1e-4]]),
    ];
    const { reached, notReached } = rankStudies(candidates, 1e-3, "cost");
    expect(reached.map((row) => [row.candidate.submissionId, row.value])).toEqual([
      ["fast", 1],
      ["slow", 5],
    ]);
    expect(notReached.map((row) => [row.candidate.submissionId, row.reason])).toEqual([
      ["silent", "noDeclaredCost"],
    ]);
  });

  it("names why a study that does not rank on this measure has no rank", () => {
    const barred: Candidate = { ...candidate("exact", [[8, 0]]), barredBy: "exactAtNodes" };
    const { reached, notReached } = rankStudies([barred], 1e-3, "nodes");
    expect(reached).toEqual([]);
    expect(notReached.map((row) => [row.candidate.submissionId, row.reason])).toEqual([
      ["exact", "exactAtNodes"],
    ]);
  });
});
