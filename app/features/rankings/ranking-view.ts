import { AppError } from "@/app/platform/errors";
import { parseRankingQuery, type RankingQuery } from "./ranking-query";

/** The state of an instrument as its address gives it. */
export interface RankingView {
  query: RankingQuery;
  /** A sentence for each parameter that was refused; the others hold, and the line stays at its place. */
  errors: Record<string, string>;
  /** What was given where it was refused. */
  given: Record<string, string>;
}

const crowdPage = 12;

/** Reads an address forgivingly: what is refused is said beside its field instead of in place of the page. */
export function readRankingView(address: URLSearchParams): RankingView {
  const search = new URLSearchParams(address);
  if (!search.has("limit")) search.set("limit", String(crowdPage));
  try {
    return { query: parseRankingQuery(search), errors: {}, given: {} };
  } catch (error) {
    const fields = error instanceof AppError ? error.details.fields : undefined;
    if (!fields) throw error;
    const names = Object.keys(fields);
    const given = Object.fromEntries(names.map((name) => [name, search.get(name) ?? ""]));
    for (const name of names) search.delete(name);
    return { query: parseRankingQuery(search), errors: { ...fields, ...commaError(given) }, given };
  }
}

/** The commonest slip gets its own sentence. */
function commaError(given: Record<string, string>): Record<string, string> {
  const text = given.tolerance ?? "";
  if (!/^\s*\d+,\d*(e[+-]?\d+)?\s*$/i.test(text)) return {};
  return { tolerance: `“${text}” has a decimal comma. Write a point: ${text.trim().replace(",", ".")}.` };
}
