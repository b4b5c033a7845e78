/** Contour lines of a square lattice, in a frame of 1000 by 1000: above, below and at zero. */
export interface ContourPaths {
  above: string;
  below: string;
}

const levels = 6;

/**
 * Marching squares. `values` is row-major with x slowest, as the exact solutions are; a cell through which a level
 * passes gets a straight piece of it, a saddle two.
 */
export function contourPaths(values: Float64Array, count: number): ContourPaths {
  const finite = values.filter(Number.isFinite);
  const largest = Math.max(...finite.map(Math.abs));
  const steps = Array.from({ length: levels }, (_, k) => ((k + 0.5) / levels) * largest);
  const draw = (level: number) => contour(values, count, level);
  return {
    above: steps.map(draw).join(""),
    below: steps.map((step) => draw(-step)).join(""),
  };
}

type Corner = [x: number, y: number, value: number];

function contour(values: Float64Array, count: number, level: number): string {
  let path = "";
  const at = (i: number, j: number): Corner => [i, j, values[i * count + j] - level];
  for (let i = 0; i + 1 < count; i++) {
    for (let j = 0; j + 1 < count; j++) {
      const corners = [at(i, j), at(i + 1, j), at(i + 1, j + 1), at(i, j + 1)];
      const crossings = corners.flatMap((corner, k) => crossing(corner, corners[(k + 1) % 4], count));
      for (let k = 0; k + 1 < crossings.length; k += 2) path += `M${crossings[k]}L${crossings[k + 1]}`;
    }
  }
  return path;
}

/** Where the edge between two corners changes sign. */
function crossing([x0, y0, v0]: Corner, [x1, y1, v1]: Corner, count: number): string[] {
  if (v0 >= 0 === v1 >= 0) return [];
  const share = v0 / (v0 - v1);
  const scale = 1000 / (count - 1);
  const x = Math.round((x0 + share * (x1 - x0)) * scale);
  const y = Math.round(1000 - (y0 + share * (y1 - y0)) * scale);
  return [`${x} ${y}`];
}
