import type { ReactNode } from "react";

export function Section({ id, title, children }: { id: string; title: string; children: ReactNode }) {
  return (
    <section aria-labelledby={id} className="sec min-w-0">
      <h2 id={id} className="mb-3">
        {title}
      </h2>
      {children}
    </section>
  );
}
