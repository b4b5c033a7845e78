import type { ReactNode } from "react";

/** At most forty words. */
export function MarginNote({ children }: { children: ReactNode }) {
  return <p className="note">{children}</p>;
}
