import type { Axis, BoundaryCondition, Classification } from "@/benchmarks/problems/definition";

export const endKindNames: Record<BoundaryCondition["kind"], string> = {
  dirichlet: "Dirichlet",
  neumann: "Neumann",
  robin: "Robin",
};

export function smoothnessText({ smoothness }: Classification): string {
  switch (smoothness.kind) {
    case "entire":
      return "entire";
    case "analytic":
      return `analytic, strip ±${Number(smoothness.stripHalfWidth.toPrecision(3))}`;
    case "finite":
      return `${smoothness.continuousDerivatives} continuous derivative${smoothness.continuousDerivatives === 1 ? "" : "s"}`;
    case "discontinuous":
      return "discontinuous";
  }
}

export function dimensionText({ dimension, isSteady }: Classification): string {
  return `${dimension}-D, ${isSteady ? "steady" : "unsteady"}`;
}

/** "periodic, 1-D" or "Dirichlet and Robin". */
export function boundaryText(
  classification: Classification,
  kinds: readonly BoundaryCondition["kind"][],
): string {
  if (classification.domain === "periodic") return `periodic, ${classification.dimension}-D`;
  const names = kinds.map((kind) => endKindNames[kind]).join(" and ");
  return classification.dimension === 1 ? names : `${names}, 2-D`;
}

/** What stands at one end of an axis. */
export function endText(axis: Axis, end: "a" | "b", conditions: readonly BoundaryCondition[]): string {
  if (axis.kind === "periodic") return "periodic";
  const kinds = conditions.filter((one) => one.axis === axis.name && one.end === end).map((one) => one.kind);
  return [...new Set(kinds)].map((kind) => endKindNames[kind]).join(", ") || "none needed";
}
