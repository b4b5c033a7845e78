/** What the form at /submit knows while it is filled in, apart from the files themselves. Pure. */

import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import { checkDeclaration } from "@/benchmarks/scoring/check-declaration";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import { assemblePart, type RunFields } from "@/app/features/submissions/assemble-part";
import { declarationPart, runPart, toDeclaration } from "@/app/features/submissions/submission-form";
import type { UploadRow } from "./upload-rows";

export type Fields = ReadonlyMap<string, string>;

export interface Team {
  slug: string;
  name: string;
}

/** A test problem as the form needs it: what it allows, and what the files are scored against in the browser. */
export interface ChosenProblem {
  revision: number;
  definition: ProblemDefinition;
}

/** What stands in the form before anything is typed, or what was typed when it came back refused. */
export function initialFields(teams: Team[], typed: Record<string, string> = {}): Fields {
  return new Map(
    Object.entries({
      team: teams[0]?.slug ?? "",
      solver: "",
      solverName: "",
      version: "",
      family: "",
      method: "",
      claim: "algebraic",
      formalOrder: "",
      description: "",
      values: "point",
      reconstruction: "none",
      degree: "3",
      precision: "float64",
      dataLicence: "CC-BY-4.0",
      yardstick: "",
      ...typed,
    }),
  );
}

/** The fields as they will be sent: the problem's own, and a grid that it allows along each axis. */
export function completeFields(fields: Fields, problem: ChosenProblem): Fields {
  const { definition, revision } = problem;
  const complete = new Map(fields).set("problem", definition.slug).set("revision", String(revision));
  complete.delete("gridX");
  complete.delete("gridY");
  definition.axes.forEach((axis, i) => {
    const name = gridFieldOf(axis.name);
    const kinds = definition.grids.kinds[i];
    const chosen = kinds.find((kind) => kind === fields.get(name));
    complete.set(name, chosen ?? kinds[0]);
  });
  return complete;
}

export function gridFieldOf(axis: "x" | "y"): "gridX" | "gridY" {
  return axis === "x" ? "gridX" : "gridY";
}

export function runFieldsOf(row: UploadRow): RunFields {
  const { name, n, role, wall, unknowns, dt, steps } = row;
  return { file: name, n, role, wall, unknowns, dt, steps };
}

const settingPart = declarationPart.pick({
  problem: true,
  claim: true,
  grid: true,
  values: true,
  reconstruction: true,
  precision: true,
});

export interface Setting {
  /** Null while grid, values or reconstruction cannot be read. */
  declaration: Declaration | null;
  /** In the order of the rows; n is empty where it is not a number yet. */
  runs: RunDeclaration[];
  /** What the server would refuse in the declaration before it opens a file. */
  refusals: Refusal[];
}

/** What can be scored so far; a claim that is not complete yet holds nothing up. */
export function settingOf(fields: Fields, rows: UploadRow[], problem: ProblemDefinition): Setting {
  const part = assemblePart(fields, rows.map(runFieldsOf));
  const { problem: slug, claim, grid, values, reconstruction, precision } = part;
  const setting = { problem: slug, grid, values, reconstruction, precision };
  const parsed = settingPart.safeParse({ ...setting, claim });
  const usable = parsed.success ? parsed : settingPart.safeParse(setting);
  const declaration = usable.success ? toDeclaration({ ...usable.data, runs: [] }, { kind: "none" }) : null;
  const runs = rows.map((row, i) => runOf(row, (part.runs as unknown[])[i]));
  const checked = runs.filter((run) => run.n.length > 0);
  const refusals = declaration && checked.length > 0 ? checkDeclaration(problem, declaration, checked) : [];
  return { declaration, runs, refusals };
}

function runOf(row: UploadRow, typed: unknown): RunDeclaration {
  const parsed = runPart.safeParse(typed);
  if (parsed.success) return parsed.data;
  const bare = runPart.safeParse({ file: row.name, n: (typed as { n?: unknown }).n, role: row.role });
  if (bare.success) return bare.data;
  const nothing = { unknowns: null, dt: null, steps: null, wallSeconds: null, yardstickSeconds: null };
  return { file: row.name, n: [], role: row.role, ...nothing };
}
