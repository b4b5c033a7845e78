import type { ChartSize } from "./convergence-spec";

/** Two drawings by the server, for the desk and for a telephone: text is never shrunk. */
export interface Drawings {
  wide: string;
  narrow: string;
}

/** Right of the plot stand names at the desk and ranks on a telephone. */
export const sizes = {
  instrument: {
    wide: { width: 568, height: 440, right: 150 },
    narrow: { width: 280, height: 400, right: 24 },
  },
  record: {
    wide: { width: 440, height: 320, right: 72 },
    narrow: { width: 270, height: 300, right: 24 },
  },
} satisfies Record<string, Record<keyof Drawings, ChartSize>>;
