import { Link } from "react-router";
import { type RankingQuery, toRankingSearch } from "@/app/features/rankings/ranking-query";
import { measures, relativeNorms } from "@/drizzle/enums";
import { normNames } from "./ranking-words";

const measureNames = { nodes: "at nodes", between: "between" };

/** Which error the line stands for. */
export function NormChoice({ query }: { query: RankingQuery }) {
  return (
    <div className="filt two3">
      <div role="group" aria-labelledby="norm-label">
        <span className="lab" id="norm-label">
          Error norm
        </span>
        <div className="seg">
          {relativeNorms.map((norm) => (
            <Choice
              key={norm}
              query={{ ...query, norm }}
              isCurrent={norm === query.norm}
              label={normNames[norm]}
            />
          ))}
        </div>
      </div>
      <div role="group" aria-labelledby="measure-label">
        <span className="lab" id="measure-label">
          Read
        </span>
        <div className="seg">
          {measures.map((measure) => (
            <Choice
              key={measure}
              query={{ ...query, measure }}
              isCurrent={measure === query.measure}
              label={measureNames[measure]}
            />
          ))}
        </div>
      </div>
    </div>
  );
}

function Choice({ query, isCurrent, label }: { query: RankingQuery; isCurrent: boolean; label: string }) {
  return (
    <Link
      to={`?${toRankingSearch({ ...query, cursor: null, limit: undefined })}`}
      aria-current={isCurrent ? "true" : undefined}
      preventScrollReset
      replace
    >
      {label}
    </Link>
  );
}
