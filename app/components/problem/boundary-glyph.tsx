import type { BoundaryCondition, Classification } from "@/benchmarks/problems/definition";

interface BoundaryGlyphProps {
  classification: Classification;
  kinds: readonly BoundaryCondition["kind"][];
}

const line = { stroke: "var(--ink)", fill: "none", strokeWidth: 1.3 };

/** A domain in small: a ring where it closes on itself, else an interval or a square with its ends. */
export function BoundaryGlyph({ classification: { domain, dimension }, kinds }: BoundaryGlyphProps) {
  return (
    <svg width="60" height="26" viewBox="0 0 60 26" aria-hidden="true" className="shrink-0">
      {domain === "periodic" ? (
        dimension === 1 ? (
          <Ring />
        ) : (
          <PeriodicSquare />
        )
      ) : dimension === 1 ? (
        <Interval left={kinds[0]} right={kinds[kinds.length - 1]} />
      ) : (
        <Square kinds={kinds} />
      )}
    </svg>
  );
}

function Ring() {
  return (
    <>
      <ellipse cx="30" cy="13" rx="23" ry="8" {...line} />
      <path d="M27 18.3 33 21 27 23.7" {...line} />
    </>
  );
}

function PeriodicSquare() {
  return (
    <>
      <rect x="20" y="3" width="20" height="20" {...line} strokeDasharray="3 2.4" />
      <path
        d="M17.6 15 20 11 22.4 15M37.6 15 40 11 42.4 15M28 .6 32 3 28 5.4M28 20.6 32 23 28 25.4"
        {...line}
      />
    </>
  );
}

type EndKind = BoundaryCondition["kind"] | undefined;

function Interval({ left, right }: { left: EndKind; right: EndKind }) {
  return (
    <>
      <path d="M9 13H51" {...line} />
      <path d="M19.5 10v6M30 10v6M40.5 10v6" {...line} strokeWidth={1} />
      <End kind={left} x={9} outward={-1} />
      <End kind={right} x={51} outward={1} />
    </>
  );
}

function End({ kind, x, outward }: { kind: EndKind; x: number; outward: 1 | -1 }) {
  const beyond = x + 3.2 * outward;
  if (kind === "neumann") return <path d={`M${x} 4V22M${beyond} 4V22`} {...line} />;
  if (kind === "robin") {
    const tip = x + 4 * outward;
    return <path d={`M${x} 4 ${tip} 7 ${x} 10 ${tip} 13 ${x} 16 ${tip} 19 ${x} 22`} {...line} />;
  }
  return <path d={`M${x} 4V22`} {...line} strokeWidth={3.4} />;
}

function Square({ kinds }: { kinds: readonly BoundaryCondition["kind"][] }) {
  if (!kinds.includes("neumann"))
    return <rect x="20" y="3" width="20" height="20" {...line} strokeWidth={3} />;
  return (
    <>
      <path d="M20 3H40M20 23H40" {...line} strokeWidth={3} />
      <path d="M20 3V23M17 3V23M40 3V23M43 3V23" {...line} />
    </>
  );
}
