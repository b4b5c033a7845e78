import { describe, expect, it } from "vitest";
import { assemblePart, partFromForm, secondsOf } from "@/app/features/submissions/assemble-part";
import { submissionPart } from "@/app/features/submissions/submission-form";
import { AppError } from "@/app/platform/errors";

const fields = new Map(
  Object.entries({
    problem: "advection-exp-sine",
    revision: "1",
    team: "path-group",
    solver: "central",
    solverName: "",
    version: "1.0",
    family: "finiteDifference",
    method: "central",
    claim: "algebraic",
    formalOrder: "4",
    description: "",
    gridX: "uniform-periodic",
    values: "point",
    reconstruction: "none",
    degree: "3",
    precision: "float64",
    dataLicence: "CC-BY-4.0",
    yardstick: "9.5 ms",
  }),
);

const run = { file: "n64.npy", n: "64", role: "study", wall: "0.4 ms", unknowns: "", dt: "", steps: "" };

describe("the part of the form at /submit", () => {
  it("is one that the schema of the API takes", () => {
    const part = submissionPart.parse(assemblePart(fields, [run]));
    expect(part.claim).toEqual({ kind: "algebraic", order: 4 });
    expect(part.runs[0]).toMatchObject({
      file: "n64.npy",
      n: [64],
      wallSeconds: 4e-4,
      yardstickSeconds: 9.5e-3,
    });
    expect(part.reconstruction).toBeNull();
    expect(part.solver).not.toHaveProperty("name");
  });

  it("gives both axes of a plane grid however they are separated", () => {
    for (const n of ["32 x 48", "32x48", "32 × 48", "32, 48"]) {
      const [plane] = assemblePart(fields, [{ ...run, n }]).runs as { n: number[] }[];
      expect(plane.n).toEqual([32, 48]);
    }
  });

  it("keeps what is no number as it was typed, so that the refusal can name it", () => {
    const part = assemblePart(new Map(fields).set("formalOrder", "four"), [{ ...run, wall: "soon" }]);
    expect(submissionPart.safeParse(part).error?.issues.map((issue) => issue.path.join("."))).toEqual(
      expect.arrayContaining(["claim.order", "runs.0.wallSeconds"]),
    );
  });

  it("reads times with their unit, and seconds without one", () => {
    expect(["0.4 ms", "250 us", "2 min", "1.5h", "0.39", "1e-3 s"].map(secondsOf)).toEqual([
      4e-4, 2.5e-4, 120, 5400, 0.39, 1e-3,
    ]);
    expect(secondsOf("")).toBeUndefined();
  });
});

describe("the part of a form that was sent without a script", () => {
  const rows = (ns: string[]): [string, string][] => [
    ...fields,
    ...ns.flatMap((n): [string, string][] => [
      ["n", n],
      ["role", "study"],
      ["wall", n === "" ? "" : "1 s"],
    ]),
  ];

  it("pairs the files with the rows that have an N, in their order", () => {
    const part = submissionPart.parse(partFromForm(rows(["16", "", "32"]), ["a.npy", "b.npy"]));
    expect(part.runs.map(({ file, n, wallSeconds }) => [file, n, wallSeconds])).toEqual([
      ["a.npy", [16], 1],
      ["b.npy", [32], 1],
    ]);
  });

  it("is refused where a file has no N", () => {
    expect(() => partFromForm(rows(["16"]), ["a.npy", "b.npy"])).toThrow(AppError);
  });
});
