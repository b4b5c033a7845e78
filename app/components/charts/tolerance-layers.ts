import { formatTolerance } from "@/app/components/ui/figures";
import type { ChartFrame } from "./chart-frame";
import { figureFont } from "./chart-theme";
import { type Layer, staff } from "./paper-layers";

export interface ToleranceMarks {
  tolerance: number;
  /** Nodes per axis at which curves meet the line. */
  rings: number[];
}

/** The tolerance line, its tag on the staff, and a ring at each reading. */
export function toleranceLayers({ tolerance, rings }: ToleranceMarks, frame: ChartFrame): Layer[] {
  const at = [{ error: tolerance }];
  const tag = { left: staff.left - 42, right: staff.right + 1 };
  return [
    {
      data: { values: at },
      mark: { type: "rule", stroke: "var(--tol)", strokeWidth: 1.6 },
      encoding: { x: { value: staff.left }, x2: { value: frame.width } },
    },
    {
      data: { values: at },
      mark: { type: "rule", stroke: "var(--tol)", strokeWidth: 19 },
      encoding: { x: { value: tag.left }, x2: { value: tag.right - 6 } },
    },
    {
      data: { values: at },
      mark: {
        type: "point",
        shape: "M-1,-1L1,0L-1,1Z",
        size: 361,
        fill: "var(--tol)",
        strokeWidth: 0,
        opacity: 1,
      },
      encoding: { x: { value: tag.right - 3 } },
    },
    {
      data: { values: at },
      mark: {
        type: "text",
        text: formatTolerance(tolerance),
        font: figureFont,
        fontSize: 13,
        fontWeight: 600,
        fill: "var(--on-tol)",
        align: "center",
        baseline: "middle",
        dy: 1,
      },
      encoding: { x: { value: (tag.left + tag.right) / 2 - 3 } },
    },
    {
      data: { values: rings.map((n) => ({ n, error: tolerance })) },
      mark: {
        type: "point",
        shape: "circle",
        size: 121,
        fill: "var(--sheet)",
        fillOpacity: 0.65,
        stroke: "var(--tol)",
        strokeWidth: 1.6,
        opacity: 1,
      },
    },
  ];
}
