import { describe, expect, it } from "vitest";
import { slugOfName } from "@/app/features/teams/slug-of-name";

describe("a team's address", () => {
  it.each([
    ["Harbour Group", "harbour-group"],
    ["Küste & Strömung", "kuste-stromung"],
    ["  --A/B--  ", "a-b"],
    ["流体", ""],
  ])("of %j is %j", (name, slug) => {
    expect(slugOfName(name)).toBe(slug);
  });

  it("never ends in a hyphen where a long name is cut", () => {
    expect(slugOfName(`${"a".repeat(59)} bcd`)).toBe("a".repeat(59));
  });
});
