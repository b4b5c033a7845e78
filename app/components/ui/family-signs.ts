import type { MethodFamily } from "@/drizzle/enums";

/** How a family is told apart: by hue, mark and dash together. Paths are drawn about the origin, 14 px wide. */
export interface FamilySign {
  colour: string;
  dash: number[];
  /** Outline of the mark, in a square from -1 to 1 for Vega and for a path scaled by 4.3. */
  path: string;
  isOpen: boolean;
  /** A dot at the centre, in the ground's colour on a solid mark and in the family's on an open one. */
  hasDot: boolean;
}

const square = "M-0.93,-0.93H0.93V0.93H-0.93Z";
const lens = "M-1.63,0Q0,-1.88 1.63,0Q0,1.88 -1.63,0Z";
const disc = "M-1,0A1,1 0 1,1 1,0A1,1 0 1,1 -1,0Z";
const hourglass = "M-1.12,-1.12H1.12L0.21,0L1.12,1.12H-1.12L-0.21,0Z";
const hat = "M-1.35,0.79L0,-1.12L1.35,0.79";

export const familySigns: Record<MethodFamily, FamilySign> = {
  finiteDifference: { colour: "var(--fam-fd)", dash: [7, 3], path: square, isOpen: false, hasDot: true },
  compactDifference: { colour: "var(--fam-cd)", dash: [13, 4], path: lens, isOpen: false, hasDot: false },
  finiteVolume: { colour: "var(--fam-fv)", dash: [8, 3, 2, 3], path: square, isOpen: true, hasDot: true },
  finiteElement: { colour: "var(--fam-fe)", dash: [2, 3], path: hat, isOpen: true, hasDot: false },
  fourier: { colour: "var(--fam-fs)", dash: [], path: disc, isOpen: false, hasDot: false },
  chebyshev: {
    colour: "var(--fam-ch)",
    dash: [14, 3, 2, 3, 2, 3],
    path: hourglass,
    isOpen: false,
    hasDot: false,
  },
  other: { colour: "var(--fam-ot)", dash: [5, 3, 5, 8], path: disc, isOpen: true, hasDot: false },
};
