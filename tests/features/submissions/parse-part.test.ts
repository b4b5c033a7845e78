import { describe, expect, it } from "vitest";
import { parsePart } from "@/app/features/submissions/parse-part";
import { declarationPart } from "@/app/features/submissions/submission-form";

const part = { problem: "p", grid: { x: { kind: "uniform" } }, runs: [{ file: "a.npy", n: [8] }] };

const fieldsOf = (given: unknown): Record<string, string> => {
  try {
    parsePart(declarationPart, given);
    return {};
  } catch (error) {
    return (error as { details: { fields: Record<string, string> } }).details.fields;
  }
};

describe("a submission part", () => {
  it("has the defaults of the contract: point values, no reconstruction, float64, role study", () => {
    expect(parsePart(declarationPart, part)).toMatchObject({
      values: "point",
      reconstruction: null,
      precision: "float64",
      grid: { x: { kind: "uniform", descending: false } },
      runs: [
        { role: "study", unknowns: null, dt: null, steps: null, wallSeconds: null, yardstickSeconds: null },
      ],
    });
  });

  it.each<[unknown, Record<string, string>]>([
    [null, { submission: "Found null, expected an object." }],
    [{ ...part, grid: undefined }, { grid: "This field is missing. Give an object." }],
    [{ ...part, precison: "float32" }, { submission: expect.stringContaining("precison is not known here") }],
    [{ ...part, precision: "half" }, { precision: 'Found "half". Use one of float64, float32.' }],
    [{ ...part, runs: [] }, { runs: "Found []. Give 1 or more entries." }],
    [
      { ...part, runs: [{ file: "a.npy", n: [8.5] }] },
      { "runs[0].n[0]": "Found 8.5, expected a whole number." },
    ],
    [
      { ...part, runs: [{ file: "a.npy", n: [8], dt: 0 }] },
      { "runs[0].dt": "Found 0. Give more than 0." },
    ],
    [{ ...part, claim: { kind: "algebraic" } }, { "claim.order": "This field is missing. Give a number." }],
    [{ ...part, problem: "Not A Slug" }, { problem: expect.stringContaining("lower-case letters") }],
  ])("says of %j what was found, where and what was expected", (given, expected) => {
    expect(fieldsOf(given)).toEqual(expected);
  });
});
