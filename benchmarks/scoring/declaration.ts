/** What an author declares about the files: the `submission` part of the API without solver and licence. */

import type { GridKind } from "../grids/grid-kind";

export interface GridDeclaration {
  kind: GridKind;
  /** The file's arrays run from b to a; only needed where the file holds no coordinates. */
  descending: boolean;
}

export type Reconstruction =
  | { kind: "trigonometric" }
  | { kind: "polynomial" }
  /** Local Lagrange interpolation of degree 1 to 7. */
  | { kind: "piecewise-polynomial"; degree: number };

export type Claim = { kind: "algebraic"; order: number } | { kind: "exponential" } | { kind: "none" };

export interface Declaration {
  /** One grid for each axis of the problem, by the axis's name. */
  grid: Partial<Record<"x" | "y", GridDeclaration>>;
  values: "point" | "cellAverage";
  reconstruction: Reconstruction | null;
  precision: "float64" | "float32";
  claim: Claim;
}

export interface RunDeclaration {
  file: string;
  /** Nodes along each axis; a repeated end node does not count. */
  n: number[];
  role: "study" | "timeStep" | "iteration";
  unknowns: number | null;
  dt: number | null;
  steps: number | null;
  wallSeconds: number | null;
  yardstickSeconds: number | null;
}
