import type { Declaration } from "@/benchmarks/scoring/declaration";

/**
 * What decides, beside solver and problem, whether a listed submission supersedes an earlier one:
 * grid kinds, precision, values and reconstruction, in a fixed order.
 */
export function variantOf(declaration: Declaration): string {
  const grids = (["x", "y"] as const)
    .filter((axis) => declaration.grid[axis])
    .map((axis) => `${axis}:${declaration.grid[axis]?.kind}`);
  const { reconstruction } = declaration;
  const rebuilt =
    reconstruction === null
      ? "none"
      : reconstruction.kind === "piecewise-polynomial"
        ? `piecewise-polynomial-${reconstruction.degree}`
        : reconstruction.kind;
  return [...grids, declaration.precision, declaration.values, rebuilt].join(" ");
}
