import { invalid } from "@/app/platform/errors";

/** The `submission` part from the fields of the form at /submit, in the browser and, without JavaScript, in its action. */

/** What the form knows of one file. Texts are as typed. */
export interface RunFields {
  file: string;
  n: string;
  role: string;
  wall: string;
  unknowns: string;
  dt: string;
  steps: string;
}

/** Names of the form's fields, by the path that the use-case names when it refuses one. */
export const fieldOfPath: Record<string, string> = {
  problem: "problem",
  revision: "problem",
  "solver.team": "team",
  "solver.solver": "solver",
  "solver.name": "solverName",
  "solver.version": "version",
  "solver.family": "family",
  "solver.method": "method",
  "solver.description": "description",
  "claim.kind": "claim",
  "claim.order": "formalOrder",
  claim: "claim",
  "grid.x.kind": "gridX",
  "grid.y.kind": "gridY",
  "grid.x": "gridX",
  "grid.y": "gridY",
  values: "values",
  reconstruction: "reconstruction",
  "reconstruction.degree": "degree",
  precision: "precision",
  dataLicence: "dataLicence",
};

/**
 * Nothing is checked here: what cannot be a number stays the text that was typed, and the schema says so at its
 * place. Fields left empty are left out.
 */
export function assemblePart(
  fields: ReadonlyMap<string, string>,
  runs: RunFields[],
): Record<string, unknown> {
  const text = (name: string) => fields.get(name)?.trim() || undefined;
  const yardstickSeconds = secondsOf(text("yardstick"));
  return withoutEmpty({
    problem: text("problem"),
    revision: numberOf(text("revision")),
    solver: withoutEmpty({
      team: text("team"),
      solver: text("solver"),
      name: text("solverName"),
      version: text("version"),
      family: text("family"),
      method: text("method"),
      description: text("description"),
    }),
    claim: claimOf(text("claim"), text("formalOrder")),
    grid: withoutEmpty({ x: gridOf(text("gridX")), y: gridOf(text("gridY")) }),
    values: text("values"),
    reconstruction: reconstructionOf(text("reconstruction"), text("degree")),
    precision: text("precision"),
    dataLicence: text("dataLicence"),
    runs: runs.map((run) => withoutEmpty({ ...runOf(run), yardstickSeconds })),
  });
}

function runOf(run: RunFields): Record<string, unknown> {
  return {
    file: run.file,
    n: nodesOf(run.n),
    role: run.role || undefined,
    unknowns: numberOf(run.unknowns),
    dt: numberOf(run.dt),
    steps: numberOf(run.steps),
    wallSeconds: secondsOf(run.wall),
  };
}

/** "64", "64 x 64", "64, 64" and "64 × 64". */
function nodesOf(typed: string): (number | string)[] {
  return typed
    .split(/[x×,;\s]+/i)
    .filter((count) => count !== "")
    .map((count) => numberOf(count) ?? count);
}

const unitSeconds: Record<string, number> = { us: 1e-6, µs: 1e-6, ms: 1e-3, s: 1, min: 60, h: 3600 };

/** Seconds of "0.4 ms", "2 min" or plain "0.39"; the text itself where it is neither. */
export function secondsOf(typed: string | undefined): number | string | undefined {
  const trimmed = typed?.trim();
  if (!trimmed) return undefined;
  const match = /^([0-9.]+(?:e[+-]?[0-9]+)?)\s*(us|µs|ms|s|min|h)?$/i.exec(trimmed);
  const value = match ? Number(match[1]) : NaN;
  const unit = match?.[2]?.toLowerCase() ?? "s";
  // Nine significant digits hide what the product of two decimals adds at its end.
  return Number.isFinite(value) ? Number((value * unitSeconds[unit]).toPrecision(9)) : trimmed;
}

function claimOf(kind: string | undefined, order: string | undefined): unknown {
  if (kind === undefined) return undefined;
  return kind === "algebraic" ? withoutEmpty({ kind, order: numberOf(order) }) : { kind };
}

function gridOf(kind: string | undefined): unknown {
  return kind === undefined ? undefined : { kind };
}

function reconstructionOf(kind: string | undefined, degree: string | undefined): unknown {
  if (kind === undefined || kind === "none") return undefined;
  return kind === "piecewise-polynomial" ? withoutEmpty({ kind, degree: numberOf(degree) }) : { kind };
}

function numberOf(typed: string | undefined): number | string | undefined {
  const trimmed = typed?.trim();
  if (!trimmed) return undefined;
  const value = Number(trimmed);
  return Number.isFinite(value) ? value : trimmed;
}

function withoutEmpty(record: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(Object.entries(record).filter(([, value]) => value !== undefined));
}

const rowFields = ["n", "role", "wall", "unknowns", "dt", "steps"] as const;

/**
 * The part of a form that was sent without a script: its rows come as repeated fields, and a row without n is one
 * that was not used. The files arrive in the order of their rows.
 */
export function partFromForm(fields: [name: string, value: string][], fileNames: string[]) {
  const columns = new Map(
    rowFields.map((name) => [name, fields.flatMap(([other, value]) => (other === name ? [value] : []))]),
  );
  const cell = (name: (typeof rowFields)[number], row: number) => columns.get(name)?.[row] ?? "";
  const used = (columns.get("n") ?? []).flatMap((n, row) => (n.trim() === "" ? [] : [row]));
  if (used.length !== fileNames.length) {
    throw invalid(
      `${fileNames.length} files were sent, and N is given for ${used.length}. Give N beside each file.`,
      { runs: "Each file needs its N." },
    );
  }
  const runs = used.map((row, index) => ({
    file: fileNames[index],
    n: cell("n", row),
    role: cell("role", row),
    wall: cell("wall", row),
    unknowns: cell("unknowns", row),
    dt: cell("dt", row),
    steps: cell("steps", row),
  }));
  return assemblePart(new Map(fields), runs);
}
