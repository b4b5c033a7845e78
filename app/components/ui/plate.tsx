import type { ReactNode } from "react";

/** A double frame, only for a verdict. */
export function Plate({
  label,
  verdict,
  children,
}: {
  label: string;
  verdict: ReactNode;
  children: ReactNode;
}) {
  return (
    <section className="plate" aria-label={label}>
      <div className="mb-3 flex items-baseline justify-between gap-4">
        <span className="lab">{label}</span>
        <b className="font-display text-20 leading-none font-medium">{verdict}</b>
      </div>
      {children}
    </section>
  );
}
