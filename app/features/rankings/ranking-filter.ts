import type { Declaration } from "@/benchmarks/scoring/declaration";
import type { Study } from "@/benchmarks/scoring/result";
import type { MethodFamily } from "@/drizzle/enums";
import type { RankingQuery } from "./ranking-query";

export interface Filterable {
  family: MethodFamily;
  declaration: Declaration;
  study: Study;
}

/** Every filter that is given must hold; `minNodes` and `maxNodes` limit the finest run's nodes per axis. */
export function matchesFilter({ family, declaration, study }: Filterable, query: RankingQuery): boolean {
  const { claim, grid, precision } = declaration;
  const finest = study.points.at(-1);
  const nodesPerAxis = finest ? Math.max(...finest.n) : 0;
  return (
    (query.family.length === 0 || query.family.includes(family)) &&
    (query.formalOrder === null || (claim.kind === "algebraic" && claim.order === query.formalOrder)) &&
    (query.observedKind === null || study.kind === query.observedKind) &&
    (query.grid === null || grid.x?.kind === query.grid || grid.y?.kind === query.grid) &&
    (query.precision === null || precision === query.precision) &&
    (query.minNodes === null || nodesPerAxis >= query.minNodes) &&
    (query.maxNodes === null || nodesPerAxis <= query.maxNodes)
  );
}
