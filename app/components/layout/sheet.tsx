import type { ReactNode } from "react";

interface SheetProps {
  /** The margin column: number, facts, notes or steps. */
  margin: ReactNode;
  className?: string;
  children: ReactNode;
}

/** Margin column, margin rule, main column. */
export function Sheet({ margin, className, children }: SheetProps) {
  return (
    <div className={`sheet pt-8 max-md:pt-5 ${className ?? ""}`}>
      <div className="mg">{margin}</div>
      <div className="mn">{children}</div>
    </div>
  );
}
