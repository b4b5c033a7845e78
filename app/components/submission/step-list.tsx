export interface StepState {
  id: string;
  title: string;
  /** What has been given so far. */
  summary: string;
  isDone: boolean;
}

/** The steps in the margin, each with what it holds so far; the first that is not complete is the current one. */
export function StepList({ steps }: { steps: StepState[] }) {
  const current = steps.findIndex((step) => !step.isDone);
  return (
    <ol className="sticky top-4 m-0 list-none p-0 max-md:static max-md:mb-5 max-md:flex" aria-label="Steps">
      {steps.map((step, i) => (
        <li
          key={step.id}
          aria-current={i === current ? "step" : undefined}
          className={`relative max-md:flex max-md:items-center ${i === current ? "max-md:flex-3" : "max-md:flex-1 max-md:last:flex-none"}`}
        >
          <a
            href={`#${step.id}`}
            className="relative z-1 grid grid-cols-[26px_1fr] gap-x-2.5 pb-4 text-15 no-underline max-md:bg-paper max-md:pr-1.5 max-md:pb-0"
          >
            <StepNumber number={i + 1} isDone={step.isDone} isCurrent={i === current} />
            <span className={i === current ? "" : "max-md:sr-only"}>
              <span className={`block leading-[26px] ${i === current ? "font-semibold" : ""}`}>
                {step.title}
              </span>
              <span className="block text-13 leading-snug text-ink-2 max-md:hidden">{step.summary}</span>
            </span>
          </a>
        </li>
      ))}
    </ol>
  );
}

function StepNumber({ number, isDone, isCurrent }: { number: number; isDone: boolean; isCurrent: boolean }) {
  const look = isCurrent
    ? "border-ink bg-ink text-paper"
    : isDone
      ? "border-ink bg-well text-ink"
      : "border-ink-3 text-ink-2";
  return (
    <span className={`grid size-[26px] place-content-center border font-figure text-14 leading-none ${look}`}>
      {number}
    </span>
  );
}
