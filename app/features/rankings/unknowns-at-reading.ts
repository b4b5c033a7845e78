import type { Study } from "@/benchmarks/scoring/result";

/**
 * Degrees of freedom at a reading: its nodes times the declared unknowns a node, which is interpolated between the
 * two runs about the reading, straight in the logarithms, and taken from the end run beyond them.
 */
export function unknownsAtReading(study: Study, reading: { nodes: number }): number {
  const { points } = study;
  const share = (index: number) => points[index].unknowns / points[index].nodes;
  const after = points.findIndex((point) => point.nodes >= reading.nodes);
  if (after === -1) return Math.ceil(reading.nodes * share(points.length - 1));
  if (after === 0 || points[after].nodes === reading.nodes) return Math.ceil(reading.nodes * share(after));
  const [below, above] = [points[after - 1], points[after]];
  const position = Math.log(reading.nodes / below.nodes) / Math.log(above.nodes / below.nodes);
  const ratio = share(after - 1) ** (1 - position) * share(after) ** position;
  // Rounding up must not add a node where the product is whole but for round-off.
  return Math.ceil(reading.nodes * ratio * (1 - 1e-12));
}
