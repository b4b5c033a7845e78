/** Two staves, and the curve read between them. */
export function Wordmark() {
  return (
    <>
      <svg width="43" height="28" viewBox="0 0 46 30" aria-hidden="true">
        <path d="M2 1V29M6.2 1V29M39.8 1V29M44 1V29" stroke="var(--ink)" strokeWidth="1.7" fill="none" />
        <path
          d="M11 4.5C18 5 20.4 9.4 22.8 15.6 25 21.4 27 25 31.4 25.3L35.2 25.4"
          stroke="var(--ink)"
          strokeWidth="2.1"
          fill="none"
          strokeLinecap="round"
        />
        <g fill="var(--ink)">
          <circle cx="11" cy="4.5" r="2.1" />
          <circle cx="22.8" cy="15.6" r="2.1" />
          <circle cx="35.2" cy="25.4" r="2.1" />
        </g>
      </svg>
      <span>Backsight</span>
    </>
  );
}
