import type { ReactNode } from "react";
import { Formula } from "@/app/components/problem/formula";

export interface RuleProps {
  id: string;
  title: string;
  /** Typeset, in the order in which they stand. */
  formulas: { markup: string; where?: string }[];
  sources: readonly string[];
  children: ReactNode;
}

/** One definition: what it is, its formula, and where it was published. */
export function Rule({ id, title, formulas, sources, children }: RuleProps) {
  return (
    <section id={id} aria-labelledby={`${id}-heading`} className="scroll-mt-4 border-t border-hair pt-4 pb-7">
      <h2 id={`${id}-heading`} className="mb-2 text-20">
        {title}
      </h2>
      <div className="prose">{children}</div>
      {formulas.map(({ markup, where }) => (
        <div key={markup} className="my-2">
          <Formula markup={markup} isBlock />
          {where ? <p className="small quiet">{where}</p> : null}
        </div>
      ))}
      {sources.length > 0 ? <p className="small quiet mt-2">{sources.join("; ")}.</p> : null}
    </section>
  );
}
