import type { GridKind } from "../grids/grid-kind";

/** Grid kinds that a periodic axis allows. */
export const periodicKinds: GridKind[] = ["uniform-periodic", "cell-centred", "listed"];

/** Grid kinds that a bounded axis allows. */
export const boundedKinds: GridKind[] = [
  "uniform",
  "cell-centred",
  "chebyshev-lobatto",
  "chebyshev-gauss",
  "legendre-lobatto",
  "legendre-gauss",
  "listed",
];
