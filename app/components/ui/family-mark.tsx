import type { MethodFamily } from "@/drizzle/enums";
import { familySigns } from "./family-signs";

/** The mark alone, for use inside another SVG: drawn about (x, y). */
export function FamilyGlyph({ family, x, y }: { family: MethodFamily; x: number; y: number }) {
  const { colour, path, isOpen, hasDot } = familySigns[family];
  const isHat = family === "finiteElement";
  return (
    <g transform={`translate(${x} ${y})`}>
      <path
        d={path}
        transform="scale(4.3)"
        vectorEffect="non-scaling-stroke"
        fill={isHat ? "none" : isOpen ? "var(--sheet)" : colour}
        stroke={isOpen ? colour : "var(--sheet)"}
        strokeWidth={isHat ? 2 : isOpen ? 1.4 : 0.8}
      />
      {hasDot ? <circle r="1.4" fill={isOpen ? colour : "var(--sheet)"} /> : null}
    </g>
  );
}

interface FamilySignProps {
  family: MethodFamily;
  className?: string;
}

/** A family's mark; its name stands beside it. */
export function FamilyMark({ family, className }: FamilySignProps) {
  return (
    <svg
      width="16"
      height="14"
      viewBox="0 0 16 14"
      aria-hidden="true"
      className={`inline-block ${className ?? ""}`}
    >
      <FamilyGlyph family={family} x={8} y={7} />
    </svg>
  );
}

/** Mark and dash, as in a chart. */
export function FamilyKey({ family, className }: FamilySignProps) {
  const { colour, dash } = familySigns[family];
  return (
    <svg
      width="46"
      height="14"
      viewBox="0 0 46 14"
      aria-hidden="true"
      className={`inline-block ${className ?? ""}`}
    >
      <path
        d="M1 7H45"
        stroke={colour}
        strokeWidth="1.75"
        strokeDasharray={dash.join(" ") || undefined}
        fill="none"
      />
      <FamilyGlyph family={family} x={23} y={7} />
    </svg>
  );
}
