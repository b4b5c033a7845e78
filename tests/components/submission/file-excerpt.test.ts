import { describe, expect, it } from "vitest";
import { excerptOf, excerptOfNotFinite } from "@/app/components/submission/file-excerpt";

const table = "x,u\n0.00, 1.5\n0.25, nan\n0.50, 2.5\n0.75, 3.5\n";

describe("the lines about a refused place", () => {
  it("are the named row and one on either side, numbered from 1", () => {
    const excerpt = excerptOf(table, "row 3, column 2 (u)");
    expect(excerpt?.lines.map((line) => [line.number, line.text, line.isNamed])).toEqual([
      [2, "0.00, 1.5", false],
      [3, "0.25, nan", true],
      [4, "0.50, 2.5", false],
    ]);
  });

  it("mark the named column where its text begins", () => {
    const { caret } = excerptOf(table, "row 3, column 2") ?? {};
    expect(caret && table.split("\n")[2].slice(caret.from, caret.from + caret.length)).toBe("nan");
  });

  it("are left out where the place is none of a text", () => {
    expect(excerptOf(table, "byte 128")).toBeNull();
    expect(excerptOf(table, "row 9")).toBeNull();
    expect(excerptOf(table, null)).toBeNull();
  });

  it("cut long lines", () => {
    expect(excerptOf("1,".repeat(500), "row 1")?.lines[0].text.length).toBeLessThan(130);
  });
});

describe("the lines about a value that is not finite", () => {
  it("are found by the value, comments left aside", () => {
    const excerpt = excerptOfNotFinite(`# nan is none\n${table}`);
    expect(excerpt?.place).toBe("Row 4, column 2");
    expect(excerptOfNotFinite("x,u\n0,1\n")).toBeNull();
  });
});
