import type { ReactNode } from "react";

interface LedgerProps {
  caption: ReactNode;
  isCaptionHidden?: boolean;
  className?: string;
  /** thead and tbody; cells of figures carry the class `num`. */
  children: ReactNode;
}

/** A table that scrolls inside its own box where it is too wide for the page. */
export function Ledger({ caption, isCaptionHidden = false, className, children }: LedgerProps) {
  return (
    // A box that may scroll must be reachable from the keyboard.
    <div
      className="scroll"
      role="region"
      aria-label={typeof caption === "string" ? caption : undefined}
      tabIndex={0}
    >
      <table className={`led ${className ?? ""}`}>
        <caption className={isCaptionHidden ? "sr-only" : ""}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}
