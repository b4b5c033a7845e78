/** The mean-square error of a periodic field, split into dissipation and dispersion. */

/** Shares of the mean-square error; they add up to it. */
export interface TakacsSplit {
  dissipation: number;
  dispersion: number;
  meanSquare: number;
}

/** Mean of term(j) over n nodes, compensated (Kahan 1965). */
function mean(n: number, term: (j: number) => number): number {
  let sum = 0;
  let lost = 0;
  for (let j = 0; j < n; j++) {
    const value = term(j) - lost;
    const next = sum + value;
    lost = next - sum - value;
    sum = next;
  }
  return sum / n;
}

/**
 * Splits the mean-square error into dissipation, (sigma_u - sigma_*)^2 + (mean u - mean u*)^2, and dispersion,
 * 2 (1 - rho) sigma_u sigma_*.
 *
 * As written both lose all digits where the error is small. Here both are computed from the error e = u - u*: with
 * v = u* - mean u*, d = e - mean e, w = v + d and D = mean(d (w + v)) / (sigma_u + sigma_*) = sigma_u - sigma_*,
 * dissipation is D^2 + (mean e)^2 and dispersion (sigma_* / sigma_u) mean((d - v D/sigma_*)^2). Neither is found by
 * subtracting the other.
 *
 * @param u values at equally spaced nodes of a periodic axis, real
 * @param exact exact values at the same nodes
 * @returns shares in the unit of u squared, or null where u or u* is constant
 * @throws RangeError where the lengths differ
 * @example takacsSplit(u, exact)?.dispersion
 * @see Takacs 1985, Monthly Weather Review 113, 1050-1065
 */
export function takacsSplit(u: Float64Array, exact: Float64Array): TakacsSplit | null {
  const n = u.length;
  if (exact.length !== n)
    throw new RangeError(`Takacs' split needs two fields of ${n} values, not ${exact.length}`);
  const meanExact = mean(n, (j) => exact[j]);
  const meanError = mean(n, (j) => u[j] - exact[j]);
  const sigmaExact = Math.sqrt(mean(n, (j) => (exact[j] - meanExact) ** 2));
  const sigma = Math.sqrt(mean(n, (j) => (exact[j] - meanExact + (u[j] - exact[j] - meanError)) ** 2));
  // A constant u leaves rounding behind: it is formed from u* and the error.
  const rounding = 4 * 2 ** -52 * (sigmaExact + Math.sqrt(mean(n, (j) => u[j] ** 2)));
  if (sigma <= rounding || sigmaExact === 0) return null;
  const difference =
    mean(n, (j) => {
      const d = u[j] - exact[j] - meanError;
      return d * (2 * (exact[j] - meanExact) + d);
    }) /
    (sigma + sigmaExact);
  const stretch = difference / sigmaExact;
  const spread = mean(n, (j) => (u[j] - exact[j] - meanError - (exact[j] - meanExact) * stretch) ** 2);
  return {
    dissipation: difference ** 2 + meanError ** 2,
    dispersion: (sigmaExact / sigma) * spread,
    meanSquare: mean(n, (j) => (u[j] - exact[j]) ** 2),
  };
}
