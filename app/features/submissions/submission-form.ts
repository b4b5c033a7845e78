import { z } from "zod";
import { gridKinds } from "@/benchmarks/grids/grid-kind";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import { dataLicences, methodFamilies, precisions, runRoles, valueKinds } from "@/drizzle/enums";

export const slugPattern = /^[a-z0-9]+(-[a-z0-9]+)*$/;

const slug = z
  .string()
  .max(60)
  .regex(slugPattern, "Use lower-case letters, digits and single hyphens, such as my-solver.");

export const claimPart = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("algebraic"), order: z.number().positive().max(64) }),
  z.strictObject({ kind: z.literal("exponential") }),
  z.strictObject({ kind: z.literal("none") }),
]);

const gridPart = z.strictObject({ kind: z.enum(gridKinds), descending: z.boolean().default(false) });

const reconstructionPart = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("trigonometric") }),
  z.strictObject({ kind: z.literal("polynomial") }),
  z.strictObject({ kind: z.literal("piecewise-polynomial"), degree: z.int().min(1).max(7) }),
]);

/** The last four create a solver that the team does not have yet; for an existing one they are not needed. */
export const solverPart = z.strictObject({
  team: slug,
  solver: slug,
  version: z.string().trim().min(1).max(60),
  name: z.string().trim().min(1).max(120).optional(),
  family: z.enum(methodFamilies).optional(),
  method: z.string().trim().min(1).max(80).optional(),
  description: z.string().trim().max(600).optional(),
});
export type SolverPart = z.infer<typeof solverPart>;

export const runPart = z.strictObject({
  file: z.string().min(1).max(200),
  n: z.array(z.int().min(1).max(4_194_304)).min(1).max(2),
  role: z.enum(runRoles).default("study"),
  unknowns: z.int().positive().nullable().default(null),
  dt: z.number().positive().nullable().default(null),
  steps: z.int().nonnegative().nullable().default(null),
  wallSeconds: z.number().nonnegative().nullable().default(null),
  yardstickSeconds: z.number().positive().nullable().default(null),
});

/** What is declared about the files: the whole `submission` part of `POST /score`. */
export const declarationPart = z.strictObject({
  problem: slug,
  revision: z.int().positive().optional(),
  solver: solverPart.optional(),
  claim: claimPart.optional(),
  grid: z.strictObject({ x: gridPart.optional(), y: gridPart.optional() }),
  values: z.enum(valueKinds).default("point"),
  reconstruction: reconstructionPart.nullable().default(null),
  precision: z.enum(precisions).default("float64"),
  dataLicence: z.enum(dataLicences).optional(),
  // checkDeclaration refuses more than 24 with the limit; this bound only keeps the parse small.
  runs: z.array(runPart).min(1).max(200),
});
export type DeclarationPart = z.infer<typeof declarationPart>;

/** The `submission` part of `POST /submissions`, shared by the page, its action and the API. */
export const submissionPart = declarationPart.extend({
  solver: solverPart,
  dataLicence: z.enum(dataLicences),
});
export type SubmissionPart = z.infer<typeof submissionPart>;
export type SubmissionPartInput = z.input<typeof submissionPart>;

/** The scorer's declaration; `claim` falls back to what the solver version claims. */
export function toDeclaration(part: DeclarationPart, fallbackClaim: Declaration["claim"]): Declaration {
  return {
    grid: part.grid,
    values: part.values,
    reconstruction: part.reconstruction,
    precision: part.precision,
    claim: part.claim ?? fallbackClaim,
  };
}

export function toRunDeclarations(part: DeclarationPart): RunDeclaration[] {
  return part.runs.map((run) => ({ ...run }));
}
