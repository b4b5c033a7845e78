import type { MethodFamily } from "@/drizzle/enums";

export const familyNames: Record<MethodFamily, string> = {
  finiteDifference: "Finite difference",
  compactDifference: "Compact difference",
  finiteVolume: "Finite volume",
  finiteElement: "Finite element",
  fourier: "Fourier",
  chebyshev: "Chebyshev",
  other: "Other",
};
