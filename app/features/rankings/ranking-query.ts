import { z } from "zod";
import { AppError } from "@/app/platform/errors";
import { gridKinds } from "@/benchmarks/grids/grid-kind";
import {
  measures,
  methodFamilies,
  precisions,
  type Measure,
  type MethodFamily,
  type Precision,
  type RelativeNorm,
} from "@/drizzle/enums";
import type { GridKind } from "@/benchmarks/grids/grid-kind";
import type { StudyKind } from "@/benchmarks/scoring/result";

export const rankBys = ["nodes", "unknowns", "cost"] as const;
export type RankBy = (typeof rankBys)[number];

/** The norm as addresses write it; every ranking is on relative norms. */
export const normParameters = ["l1", "l2", "max"] as const;
export type NormParameter = (typeof normParameters)[number];

export const studyKinds = [
  "algebraic",
  "exponential",
  "mixed",
  "undecided",
  "floor",
  "none",
] as const satisfies StudyKind[];

export const relativeNormOf: Record<NormParameter, RelativeNorm> = {
  l1: "relL1",
  l2: "relL2",
  max: "relMax",
};
export const normParameterOf: Record<RelativeNorm, NormParameter> = {
  relL1: "l1",
  relL2: "l2",
  relMax: "max",
};

export interface RankingQuery {
  tolerance: number;
  norm: RelativeNorm;
  measure: Measure;
  by: RankBy;
  /** Empty: every family. */
  family: MethodFamily[];
  formalOrder: number | null;
  observedKind: StudyKind | null;
  grid: GridKind | null;
  precision: Precision | null;
  /** Both limit the finest run's nodes per axis. */
  minNodes: number | null;
  maxNodes: number | null;
  cursor: string | null;
  limit: number;
}

const oneOf = <const T extends readonly [string, ...string[]]>(values: T) =>
  z.enum(values, `Use one of ${values.join(", ")}.`);

const numberText = (sentence: string) =>
  z
    .string()
    .trim()
    .regex(/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i, sentence)
    .transform(Number);

const wholeText = (sentence: string, largest: number) =>
  z
    .string()
    .trim()
    .regex(/^\d+$/, sentence)
    .transform(Number)
    .pipe(z.number().min(1, sentence).max(largest, sentence));

const nodesSentence = "Give a whole number of nodes from 1 to 4194304.";
const toleranceSentence = "Give a positive relative error, such as 1e-6.";

/** The parameters of a ranking, with the API's defaults; names and values as addresses write them. */
export const rankingParameters = z.object({
  tolerance: numberText(toleranceSentence)
    .pipe(z.number().positive(toleranceSentence).max(1e3, "The tolerance is at most 1000."))
    .default(1e-6),
  norm: oneOf(normParameters).default("l2"),
  measure: oneOf(measures).default("nodes"),
  by: oneOf(rankBys).default("nodes"),
  family: z.array(oneOf(methodFamilies)).default([]),
  formalOrder: numberText("Give the formal order as a number, such as 4.").optional(),
  observedKind: oneOf(studyKinds).optional(),
  grid: oneOf(gridKinds).optional(),
  precision: oneOf(precisions).optional(),
  minNodes: wholeText(nodesSentence, 4_194_304).optional(),
  maxNodes: wholeText(nodesSentence, 4_194_304).optional(),
  cursor: z.string().max(400).optional(),
  limit: wholeText("Give a limit from 1 to 200.", 200).default(50),
});

/**
 * Reads a ranking's parameters from an address. Parameters that it does not know are left alone,
 * since a page's address may carry others; an empty value counts as absent.
 */
export function parseRankingQuery(search: URLSearchParams): RankingQuery {
  const given: Record<string, string | string[]> = {};
  for (const name of Object.keys(rankingParameters.shape)) {
    const values = search.getAll(name).filter((value) => value !== "");
    if (values.length === 0) continue;
    given[name] = name === "family" ? values.flatMap((value) => value.split(",")) : values[0];
  }
  const parsed = rankingParameters.safeParse(given);
  if (!parsed.success) {
    const fields = Object.fromEntries(
      parsed.error.issues.map((issue) => [String(issue.path[0]), issue.message]),
    );
    throw new AppError("invalid", `The ranking cannot be read: ${Object.keys(fields).join(", ")}.`, {
      fields,
    });
  }
  const { norm, formalOrder, observedKind, grid, precision, minNodes, maxNodes, cursor, ...rest } =
    parsed.data;
  return {
    ...rest,
    norm: relativeNormOf[norm],
    formalOrder: formalOrder ?? null,
    observedKind: observedKind ?? null,
    grid: grid ?? null,
    precision: precision ?? null,
    minNodes: minNodes ?? null,
    maxNodes: maxNodes ?? null,
    cursor: cursor ?? null,
  };
}

/** The address of a view: only what differs from the defaults, in a fixed order. */
export function toRankingSearch(query: Partial<RankingQuery>): URLSearchParams {
  const search = new URLSearchParams();
  const put = (name: string, value: string | number | null | undefined, standard?: string | number) => {
    if (value !== undefined && value !== null && value !== standard) search.set(name, String(value));
  };
  if (query.tolerance !== undefined && query.tolerance !== 1e-6) {
    put("tolerance", query.tolerance.toExponential().replace("e+", "e"));
  }
  put("norm", query.norm && normParameterOf[query.norm], "l2");
  put("measure", query.measure, "nodes");
  put("by", query.by, "nodes");
  for (const family of query.family ?? []) search.append("family", family);
  put("formalOrder", query.formalOrder);
  put("observedKind", query.observedKind);
  put("grid", query.grid);
  put("precision", query.precision);
  put("minNodes", query.minNodes);
  put("maxNodes", query.maxNodes);
  put("cursor", query.cursor);
  put("limit", query.limit, 50);
  return search;
}
