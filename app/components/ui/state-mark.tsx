import type { ReactNode } from "react";

export type MarkState = "listed" | "ok" | "finding" | "refused" | "none" | "running" | "withdrawn";

const colours: Record<MarkState, string> = {
  listed: "text-ok",
  ok: "text-ok",
  finding: "text-warn",
  refused: "text-bad",
  none: "text-ink-2",
  running: "text-ink-2",
  withdrawn: "text-ink-2",
};

/** A shape and a word: neither the shape nor its colour stands alone. */
export function StateMark({ state, children }: { state: MarkState; children: ReactNode }) {
  return (
    <span className={`st ${colours[state]}`}>
      <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true">
        {shapes[state]}
      </svg>
      {children}
    </span>
  );
}

const ring = { cx: 7, cy: 7, r: 5.4, fill: "none", stroke: "currentColor", strokeWidth: 1.4 };

const dottedRing = (
  <>
    <circle {...ring} />
    <circle cx="7" cy="7" r="2.6" fill="currentColor" />
  </>
);

const shapes: Record<MarkState, ReactNode> = {
  listed: dottedRing,
  ok: dottedRing,
  finding: (
    <path
      d="M7 1.8L12.8 12H1.2Z"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.4"
      strokeLinejoin="round"
    />
  ),
  refused: <path d="M1.8 1.8H12.2V12.2H1.8ZM4 7H10" fill="none" stroke="currentColor" strokeWidth="1.4" />,
  none: <circle {...ring} strokeDasharray="2.4 2.1" />,
  running: (
    <>
      <circle {...ring} />
      <path d="M7 7V1.6A5.4 5.4 0 0 1 11.7 9.7Z" fill="currentColor" />
    </>
  ),
  withdrawn: (
    <>
      <circle {...ring} />
      <path d="M2 12L12 2" stroke="currentColor" strokeWidth="1.4" />
    </>
  ),
};
