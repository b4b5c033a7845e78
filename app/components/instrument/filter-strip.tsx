import type { ReactNode } from "react";
import { Link } from "react-router";
import { type RankingQuery, studyKinds, toRankingSearch } from "@/app/features/rankings/ranking-query";
import type { GridKind } from "@/benchmarks/grids/grid-kind";
import { kindNames } from "./ranking-words";
import type { RankingView } from "@/app/features/rankings/ranking-view";
import { useShownValue } from "./use-shown-value";

const formalOrders = ["1", "2", "3", "4", "6", "8"];

interface FilterStripProps {
  view: RankingView;
  gridKinds: readonly GridKind[];
  counted: string;
}

/** Filters other than norm and family; folded on a telephone. */
export function FilterStrip({ view: { query, errors, given }, gridKinds, counted }: FilterStripProps) {
  return (
    <details className="fset">
      <summary>
        <b>Filters</b> <span className="fig">{counted}</span>
      </summary>
      <div className="frow">
        <Choice name="formalOrder" label="Formal order" value={query.formalOrder?.toString() ?? ""}>
          {formalOrders.map((order) => (
            <option key={order}>{order}</option>
          ))}
        </Choice>
        <Choice name="observedKind" label="Observed kind" value={query.observedKind ?? ""}>
          {studyKinds.map((kind) => (
            <option key={kind} value={kind}>
              {kindNames[kind]}
            </option>
          ))}
        </Choice>
        <Choice name="grid" label="Grid kind" value={query.grid ?? ""}>
          {gridKinds.map((kind) => (
            <option key={kind}>{kind}</option>
          ))}
        </Choice>
        <div className="fs" role="group" aria-labelledby="finest-label">
          <span className="lab" id="finest-label">
            Finest N
          </span>
          <span className="rng">
            <Limit
              name="minNodes"
              label="from"
              value={given.minNodes ?? query.minNodes}
              error={errors.minNodes}
            />
            <Limit
              name="maxNodes"
              label="to"
              value={given.maxNodes ?? query.maxNodes}
              error={errors.maxNodes}
            />
          </span>
        </div>
        <Choice name="precision" label="Precision" value={query.precision ?? ""}>
          <option value="float64">double</option>
          <option value="float32">single</option>
        </Choice>
        <p className="fs cnt">
          <span className="fig shown">{counted}</span>
          {hasFilters(query) ? (
            <Link
              to={`?${toRankingSearch({ tolerance: query.tolerance, norm: query.norm, measure: query.measure })}`}
              preventScrollReset
            >
              Reset filters
            </Link>
          ) : null}
          <button type="submit" className="txtb [@media(scripting:enabled)]:hidden">
            Apply
          </button>
        </p>
      </div>
      {errors.minNodes || errors.maxNodes ? (
        <p className="tol-err mb-3" role="alert">
          {errors.minNodes ?? errors.maxNodes}
        </p>
      ) : null}
    </details>
  );
}

function hasFilters(query: RankingQuery): boolean {
  const { family, formalOrder, observedKind, grid, precision, minNodes, maxNodes } = query;
  return (
    family.length > 0 ||
    [formalOrder, observedKind, grid, precision, minNodes, maxNodes].some((one) => one !== null)
  );
}

function Choice({
  name,
  label,
  value,
  children,
}: {
  name: string;
  label: string;
  value: string;
  children: ReactNode;
}) {
  const [shown, setShown] = useShownValue(value);
  return (
    <label className="fs">
      <span className="lab">{label}</span>
      <select className="in" name={name} value={shown} onChange={(event) => setShown(event.target.value)}>
        <option value="">any</option>
        {children}
      </select>
    </label>
  );
}

interface LimitProps {
  name: string;
  label: string;
  value: number | string | null;
  error: string | undefined;
}

function Limit({ name, label, value, error }: LimitProps) {
  const [shown, setShown] = useShownValue(value === null ? "" : String(value));
  return (
    <input
      className="in font-figure"
      name={name}
      value={shown}
      onChange={(event) => setShown(event.target.value)}
      onBlur={(event) => {
        if (event.target.value !== String(value ?? "")) event.target.form?.requestSubmit();
      }}
      inputMode="numeric"
      placeholder={label}
      aria-label={`Finest N, ${label}`}
      aria-invalid={error ? true : undefined}
    />
  );
}
