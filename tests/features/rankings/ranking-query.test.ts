import { describe, expect, it } from "vitest";
import { parseRankingQuery, toRankingSearch } from "@/app/features/rankings/ranking-query";

const parse = (search: string) => parseRankingQuery(new URLSearchParams(search));

describe("the parameters of a ranking", () => {
  it("default to 1e-6 in the relative L2 norm at the nodes, by nodes, 50 a page", () => {
    expect(parse("")).toEqual({
      tolerance: 1e-6,
      norm: "relL2",
      measure: "nodes",
      by: "nodes",
      family: [],
      formalOrder: null,
      observedKind: null,
      grid: null,
      precision: null,
      minNodes: null,
      maxNodes: null,
      cursor: null,
      limit: 50,
    });
  });

  it("take a family that is repeated or listed with commas, and leave empty and foreign ones alone", () => {
    expect(parse("family=fourier&family=chebyshev").family).toEqual(["fourier", "chebyshev"]);
    expect(parse("family=fourier,chebyshev&grid=&utm=x").family).toEqual(["fourier", "chebyshev"]);
  });

  it.each([
    ["tolerance=0", "tolerance"],
    ["tolerance=-1e-6", "tolerance"],
    ["tolerance=0x10", "tolerance"],
    ["tolerance=NaN", "tolerance"],
    ["tolerance=1e-400", "tolerance"],
    ["norm=l3", "norm"],
    ["measure=all", "measure"],
    ["by=luck", "by"],
    ["family=magic", "family"],
    ["formalOrder=four", "formalOrder"],
    ["minNodes=1.5", "minNodes"],
    ["limit=0", "limit"],
    ["limit=201", "limit"],
  ])("refuse %s by naming the parameter", (search, name) => {
    expect(() => parse(search)).toThrow(
      expect.objectContaining({ kind: "invalid", details: { fields: { [name]: expect.any(String) } } }),
    );
  });

  it("come back from an address as they went in", () => {
    const search =
      "tolerance=3.1e-9&norm=max&measure=between&by=cost&family=fourier&formalOrder=4&grid=uniform&minNodes=8&limit=10";
    expect(toRankingSearch(parse(search)).toString()).toBe(search);
    expect(toRankingSearch(parse("")).toString()).toBe("");
    expect(toRankingSearch(parse("tolerance=100")).toString()).toBe("tolerance=1e2");
  });
});
