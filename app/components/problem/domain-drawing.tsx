import type { DomainFigure, EdgeKind } from "./domain-figure";
import { Edge } from "./domain-edge";

interface DomainDrawingProps {
  figure: DomainFigure;
  /** The interval of x, typeset. */
  intervals: string[];
}

const signs: Record<EdgeKind, string> = {
  dirichlet: "Hatched line: Dirichlet.",
  neumann: "Double line: Neumann.",
  robin: "Zigzag: Robin.",
  periodic: "Dashed line with arrow: periodic.",
  none: "Thin line: no condition.",
};

const names: Record<EdgeKind, string> = {
  dirichlet: "Dirichlet",
  neumann: "Neumann",
  robin: "Robin",
  periodic: "periodic",
  none: "no condition",
};

/** The domain with its ends as they are conditioned, and the exact solution over it. */
export function DomainDrawing({ figure, intervals }: DomainDrawingProps) {
  const { edges, contours } = figure;
  const kinds = [...new Set(Object.values(edges).filter((kind) => kind !== null))];
  const caption = [...kinds.map((kind) => signs[kind]), solutionText(figure)].join(" ");
  return (
    <figure className="domain">
      <div
        className={contours ? "domain-plot flat" : "domain-plot"}
        style={contours ? { aspectRatio: `1 / ${figure.aspect}` } : undefined}
        role="img"
        aria-label={caption}
      >
        <svg viewBox="0 0 1000 1000" preserveAspectRatio="none" aria-hidden="true">
          {contours ? <Contours {...contours} /> : <Curves first={figure.first} last={figure.last} />}
        </svg>
        <Edge kind={edges.left} side="left" />
        <Edge kind={edges.right} side="right" />
        {edges.bottom ? <Edge kind={edges.bottom} side="bottom" /> : null}
        {edges.top ? <Edge kind={edges.top} side="top" /> : null}
      </div>
      <div className={contours ? "domain-axis flat" : "domain-axis"}>
        <b>{names[edges.left]}</b>
        <span dangerouslySetInnerHTML={{ __html: intervals.join(", ") }} />
        <b>{names[edges.right]}</b>
      </div>
      <figcaption className="figcap">{caption}</figcaption>
    </figure>
  );
}

const scaling = { vectorEffect: "non-scaling-stroke", fill: "none" } as const;

function Curves({ first, last }: { first: string | null; last: string | null }) {
  return (
    <>
      {first ? (
        <path d={first} {...scaling} stroke="var(--ink)" strokeWidth="1.2" strokeDasharray="4 3" />
      ) : null}
      {last ? <path d={last} {...scaling} stroke="var(--ink)" strokeWidth="2" /> : null}
    </>
  );
}

function Contours({ above, below }: { above: string; below: string }) {
  return (
    <>
      <path d={above} {...scaling} stroke="var(--pos)" strokeWidth="1.3" />
      <path d={below} {...scaling} stroke="var(--neg)" strokeWidth="1.3" strokeDasharray="4 3" />
    </>
  );
}

function solutionText({ contours, field, firstTime, lastTime, isModulus }: DomainFigure): string {
  const what = isModulus ? `|${field}|` : field;
  if (contours) {
    const time = lastTime === null ? "" : ` at t = ${lastTime}`;
    return `Contours of ${what}${time}: brown and full above zero, blue and dashed below.`;
  }
  return lastTime === null
    ? `The line is the exact solution ${what}.`
    : `${what} dashed at t = ${firstTime}, full line at t = ${lastTime}.`;
}
