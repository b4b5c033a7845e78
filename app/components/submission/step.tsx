import type { ReactNode } from "react";

interface StepProps {
  id: string;
  title: string;
  remark?: string;
  /** No rule divides it from what is above. */
  isFirst?: boolean;
  /** Stands at the right of the heading. */
  state?: ReactNode;
  children: ReactNode;
}

/** One step of the form; all steps are on one page. */
export function Step({ id, title, remark, isFirst = false, state, children }: StepProps) {
  return (
    <section
      id={id}
      aria-labelledby={`${id}-heading`}
      className={`scroll-mt-4 pb-8 ${isFirst ? "" : "border-t border-rule pt-4"}`}
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
