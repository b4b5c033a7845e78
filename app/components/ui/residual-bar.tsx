interface ResidualBarProps {
  value: number;
  limit: number;
  isWithin: boolean;
}

/** Decades that the bar covers on either side of the limit. */
const decades = 8;

/** A measured residual on a log scale, with an upright stroke at its limit. */
export function ResidualBar({ value, limit, isWithin }: ResidualBarProps) {
  const place = value > 0 ? 0.5 + Math.log10(value / limit) / (2 * decades) : 0;
  const width = Math.min(200, Math.max(1.5, 200 * place));
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_58px] items-center gap-x-3">
      <svg viewBox="0 0 200 14" preserveAspectRatio="none" aria-hidden="true" className="block h-3.5 w-full">
        <path d="M0 10H200" stroke="var(--hair)" />
        <rect x="0" y="5" width={width} height="5" fill={isWithin ? "var(--ink)" : "var(--bad)"} />
        <path d="M100 1V14" stroke="var(--ink)" strokeWidth="1.6" />
      </svg>
      <b className={`text-13 leading-none ${isWithin ? "" : "text-bad"}`}>
        {isWithin ? "agrees" : "differs"}
      </b>
    </div>
  );
}
