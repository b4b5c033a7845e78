/** Kinds of grid along one axis, by the names of the API. */
export const gridKinds = [
  "uniform-periodic",
  "uniform",
  "cell-centred",
  "chebyshev-lobatto",
  "chebyshev-gauss",
  "legendre-lobatto",
  "legendre-gauss",
  "listed",
] as const;

export type GridKind = (typeof gridKinds)[number];
