import { type DenseMatrix, denseMatrix, multiply, solveDense } from "./dense-matrix";

/** Numerator of the diagonal Pade approximant of degree 13; the denominator has alternating signs. */
const pade = [
  64764752532480000, 32382376266240000, 7771770303897600, 1187353796428800, 129060195264000, 10559470521600,
  670442572800, 33522128640, 1323241920, 40840800, 960960, 16380, 182, 1,
];
const largestNorm = 5.371920351148152;

/**
 * The exponential of a square matrix, by scaling and squaring with the Pade approximant of degree 13.
 *
 * @param a the matrix, left as it is
 * @returns exp(a)
 * @throws RangeError where an entry is not finite
 * @example matrixExponential(denseMatrix(1, () => 1)).values[0] // 2.718281828459045
 * @see N. J. Higham, The scaling and squaring method for the matrix exponential revisited, SIAM J. Matrix Anal. Appl. 26
 *   (2005) 1179-1193
 */
export function matrixExponential(a: DenseMatrix): DenseMatrix {
  const norm = oneNorm(a);
  if (!Number.isFinite(norm)) throw new RangeError("the exponential of a matrix needs finite entries");
  const squarings = Math.max(0, Math.ceil(Math.log2(norm / largestNorm)));
  let result = approximant(scale(a, 2 ** -squarings));
  for (let step = 0; step < squarings; step++) result = multiply(result, result);
  return result;
}

function oneNorm({ size, values }: DenseMatrix): number {
  let largest = 0;
  for (let j = 0; j < size; j++) {
    let total = 0;
    for (let i = 0; i < size; i++) total += Math.abs(values[i * size + j]);
    largest = total > largest || Number.isNaN(total) ? total : largest;
  }
  return largest;
}

function scale(a: DenseMatrix, factor: number): DenseMatrix {
  return { size: a.size, values: a.values.map((value) => value * factor) };
}

function combination(terms: readonly (readonly [number, DenseMatrix])[]): DenseMatrix {
  const [[, first]] = terms;
  const values = new Float64Array(first.values.length);
  for (const [factor, term] of terms)
    for (let k = 0; k < values.length; k++) values[k] += factor * term.values[k];
  return { size: first.size, values };
}

function approximant(a: DenseMatrix): DenseMatrix {
  const one = denseMatrix(a.size, (i, j) => (i === j ? 1 : 0));
  const a2 = multiply(a, a);
  const a4 = multiply(a2, a2);
  const a6 = multiply(a4, a2);
  const high = (k: number) =>
    multiply(
      a6,
      combination([
        [pade[k + 12], a6],
        [pade[k + 10], a4],
        [pade[k + 8], a2],
      ]),
    );
  const low = (k: number, top: DenseMatrix) =>
    combination([
      [1, top],
      [pade[k + 6], a6],
      [pade[k + 4], a4],
      [pade[k + 2], a2],
      [pade[k], one],
    ]);
  const odd = multiply(a, low(1, high(1)));
  const even = low(0, high(0));
  const denominator = combination([
    [1, even],
    [-1, odd],
  ]);
  const numerator = combination([
    [1, even],
    [1, odd],
  ]);
  return { size: a.size, values: solveDense(denominator, numerator.values, a.size) };
}
