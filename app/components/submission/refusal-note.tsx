import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Excerpt } from "./file-check";

interface RefusalNoteProps {
  refusal: Refusal;
  excerpt?: Excerpt | null;
  /** What to do with the file, where the page knows it. */
  remedy?: string;
}

/** What is wrong with a file: the place, what was found and expected, what to do, and the lines themselves. */
export function RefusalNote({ refusal, excerpt = null, remedy }: RefusalNoteProps) {
  const place = excerpt?.place ?? placeOf(refusal.where, refusal.message);
  return (
    <div>
      <p className="border-l-3 border-bad pl-3 text-14 text-pretty">
        {place ? <b>{place}: </b> : null}
        {refusal.message}
        {remedy ? ` ${remedy}` : null}
      </p>
      {excerpt ? <ExcerptLines excerpt={excerpt} /> : null}
    </div>
  );
}

/** Most messages begin with their place; it is then not said twice. */
function placeOf(where: string | null, message: string): string | null {
  if (!where || message.toLowerCase().includes(where.toLowerCase())) return null;
  return where.charAt(0).toUpperCase() + where.slice(1);
}

function ExcerptLines({ excerpt }: { excerpt: Excerpt }) {
  return (
    <pre
      aria-label="Place in the file"
      className="mt-2 ml-3.5 max-w-[560px] overflow-x-auto border border-hair-2 bg-sheet py-1.5 font-figure text-13 leading-normal max-md:ml-0"
    >
      {excerpt.lines.map((line) => (
        <span key={line.number}>
          <ExcerptLine number={line.number} className={line.isNamed ? "bg-bad-wash" : ""}>
            {line.text}
          </ExcerptLine>
          {line.isNamed && excerpt.caret ? (
            <ExcerptLine number={null} className="font-semibold text-bad">
              {" ".repeat(excerpt.caret.from) + "^".repeat(excerpt.caret.length)}
            </ExcerptLine>
          ) : null}
        </span>
      ))}
    </pre>
  );
}

interface ExcerptLineProps {
  number: number | null;
  className: string;
  children: string;
}

function ExcerptLine({ number, className, children }: ExcerptLineProps) {
  return (
    <span className={`block px-3 whitespace-pre ${className}`}>
      <span className="inline-block min-w-[42px] text-ink-3 select-none">{number}</span>
      {children}
    </span>
  );
}
