import type { MethodFamily } from "@/drizzle/enums";
import type { FramePoint } from "./chart-frame";

/** One line of a chart with its marks. */
export interface Curve {
  id: string;
  /** At the curve's end; null where it goes unnamed. */
  label: string | null;
  /** Shown where there is no room for a name. */
  shortLabel: string | null;
  /** Whole, for the hover text. */
  name: string;
  family: MethodFamily;
  points: FramePoint[];
  /** Samples of the interpolant. */
  line: FramePoint[];
  weight: "normal" | "thin" | "strong";
  /** False where many are drawn: only the line. */
  hasMarks: boolean;
}
