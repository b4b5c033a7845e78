import { Link } from "react-router";
import { formatTolerance } from "@/app/components/ui/figures";
import { type RankingQuery, toRankingSearch } from "@/app/features/rankings/ranking-query";
import { shiftDecade } from "./ranking-words";
import type { RankingView } from "@/app/features/rankings/ranking-view";
import { useShownValue } from "./use-shown-value";

/** Read out, a decade down, typed, a decade up; all of it works by the address alone. */
export function ToleranceBox({ view, what }: { view: RankingView; what: string }) {
  const { query, errors, given } = view;
  const [value, setValue] = useShownValue(given.tolerance ?? formatTolerance(query.tolerance));
  const [mantissa, exponent] = query.tolerance.toExponential().split("e");
  return (
    <div className="tolbox">
      <label className="lab" htmlFor="tolerance">
        Tolerance
      </label>
      <span className="tol-read" aria-hidden="true">
        {mantissa} × 10<sup>{exponent.replace("-", "−").replace("+", "")}</sup>
      </span>
      <div className="step">
        <DecadeLink query={query} decades={-1} />
        <input
          id="tolerance"
          name="tolerance"
          value={value}
          onChange={(event) => setValue(event.target.value)}
          onBlur={(event) => {
            if (event.target.value !== formatTolerance(query.tolerance)) event.target.form?.requestSubmit();
          }}
          inputMode="text"
          spellCheck={false}
          autoComplete="off"
          aria-invalid={errors.tolerance ? true : undefined}
          aria-describedby="tolerance-note"
        />
        <DecadeLink query={query} decades={1} />
      </div>
      <div id="tolerance-note">
        {errors.tolerance ? (
          <p role="alert" className="tol-err">
            {errors.tolerance}
          </p>
        ) : null}
        <p className="tol-what">on the {what}</p>
      </div>
    </div>
  );
}

function DecadeLink({ query, decades }: { query: RankingQuery; decades: 1 | -1 }) {
  const tolerance = shiftDecade(query.tolerance, decades);
  const isWithin = tolerance >= 1e-17 && tolerance <= 1;
  const text = decades === 1 ? "×10" : "÷10";
  if (!isWithin) return <span className="off">{text}</span>;
  const search = toRankingSearch({ ...query, tolerance, cursor: null, limit: undefined });
  return (
    <Link to={`?${search}`} preventScrollReset replace>
      {text}
      <span className="sr-only">, {decades === 1 ? "raise" : "lower"} the line by one decade</span>
    </Link>
  );
}
