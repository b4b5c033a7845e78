import type { ReactNode } from "react";

interface StepProps {
  id: string;
  title: string;
  remark?: string;
  /** Stands at the right of the heading. */
  state?: ReactNode;
  children: ReactNode;
}

/** One step of the form; all steps are on one page. */
export function Step({ id, title, remark, state, children }: StepProps) {
  return (
    <section
      id={id}
      aria-labelledby={`${id}-heading`}
      className="scroll-mt-4 border-t border-rule pt-4 pb-8 first-of-type:border-t-0 first-of-type:pt-0"
    >
      <header className="mb-3.5 flex flex-wrap items-baseline gap-x-3.5 gap-y-0.5">
        <h2 id={`${id}-heading`} className="text-20">
          {title}
        </h2>
        {remark ? <span className="text-13 text-ink-2">{remark}</span> : null}
        {state ? <span className="ml-auto text-14">{state}</span> : null}
      </header>
      {children}
    </section>
  );
}
