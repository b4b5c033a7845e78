import { Link } from "react-router";
import { Chart } from "@/app/components/charts/chart";
import type { Drawings } from "@/app/components/charts/drawings";
import type { Ranking } from "@/app/features/rankings/ranking";
import { toRankingSearch } from "@/app/features/rankings/ranking-query";
import type { GridKind } from "@/benchmarks/grids/grid-kind";
import { FamilyChoice } from "./family-choice";
import { FilterStrip } from "./filter-strip";
import { InstrumentForm } from "./instrument-form";
import { NormChoice } from "./norm-choice";
import { PlottedPoints } from "./plotted-points";
import { chartOfRanking } from "./ranking-chart";
import { RankingTable } from "./ranking-table";
import type { RankingView } from "@/app/features/rankings/ranking-view";
import { errorTitle } from "./ranking-words";
import { ReadingNotes } from "./reading-notes";
import { ToleranceBox } from "./tolerance-box";

export interface InstrumentProps {
  ranking: Ranking;
  view: RankingView;
  drawings: Drawings;
  outputTime: number | null;
  gridKinds: readonly GridKind[];
}

/** The convergence chart and the ranking, joined by the tolerance line and one nodes scale. */
export function Instrument({ ranking, view, drawings, outputTime, gridKinds }: InstrumentProps) {
  const chart = chartOfRanking(ranking, outputTime);
  const { code } = ranking.problem;
  const shown = ranking.total + ranking.notReached.length;
  return (
    <section className="inst" aria-labelledby="accuracy-heading">
      <h2 className="sr-only" id="accuracy-heading">
        Accuracy of submissions to {code}
      </h2>
      <InstrumentForm view={view}>
        <FilterStrip view={view} gridKinds={gridKinds} counted={`${shown} shown`} />
        <div className="inst-body">
          <div className="inst-top">
            <div className="inst-l">
              <ToleranceBox view={view} what={errorTitle(ranking.norm, ranking.measure, outputTime)} />
              <div className="filters">
                <NormChoice query={view.query} />
                <FamilyChoice chosen={view.query.family} />
              </div>
            </div>
            <div className="inst-plot">
              <Chart
                chart={chart}
                drawings={drawings}
                layout="instrument"
                label={`Convergence curves for ${code}, log error against log nodes. A table of the plotted points follows the ranking.`}
              />
            </div>
            <ReadingNotes ranking={ranking} scales={chart.scales} />
          </div>
          {shown === 0 ? (
            <NothingPasses view={view} />
          ) : (
            <RankingTable ranking={ranking} scales={chart.scales} />
          )}
          <More ranking={ranking} view={view} />
        </div>
      </InstrumentForm>
      <PlottedPoints curves={ranking.curves} />
    </section>
  );
}

function NothingPasses({ view: { query } }: { view: RankingView }) {
  const isFiltered =
    query.family.length > 0 ||
    [query.formalOrder, query.observedKind, query.grid, query.precision, query.minNodes, query.maxNodes].some(
      (one) => one !== null,
    );
  return (
    <div className="none">
      <b>{isFiltered ? "No submission passes these filters" : "No record yet"}</b>
      <span>
        {isFiltered
          ? "The chart and the ranking are empty until at least one submission passes."
          : "The chart and the ranking fill with the first listed submission."}
      </span>
      {isFiltered ? (
        <Link className="btn" to="?" preventScrollReset>
          Reset filters
        </Link>
      ) : null}
    </div>
  );
}

/** The next rows are fetched by their number, since a page of the ranking starts at the line's first reading. */
function More({ ranking, view }: { ranking: Ranking; view: RankingView }) {
  const rest = ranking.total - ranking.rows.length;
  if (rest <= 0) return null;
  const limit = Math.min(200, view.query.limit + Math.max(rest, 1));
  return (
    <p className="more">
      <Link to={`?${toRankingSearch({ ...view.query, limit, cursor: null })}`} preventScrollReset>
        {rest} more
      </Link>
      <span className="quiet small">Their curves stay drawn.</span>
    </p>
  );
}
