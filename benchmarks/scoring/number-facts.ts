/** What the numbers of a field give away about how they were stored. */

/** More decimal digits than this are not counted. */
const mostDigits = 8;

/**
 * True where every value is a single-precision number, though the array is not.
 *
 * @example holdsSinglePrecision(Float64Array.of(Math.fround(0.1))) // true
 * @see IEEE 754-2019, binary32
 */
export function holdsSinglePrecision(values: Float64Array): boolean {
  for (let i = 0; i < values.length; i++) if (Math.fround(values[i]) !== values[i]) return false;
  return values.some((value) => !Number.isInteger(value));
}

/** Significant decimal digits of a value, or null above 8. */
function digitsOf(value: number): number | null {
  if (Number(value.toPrecision(mostDigits)) !== value) return null;
  const mantissa = value.toExponential(mostDigits - 1).split("e")[0];
  return mantissa.replace(/[-.]/g, "").replace(/0+$/, "").length;
}

/**
 * The most significant decimal digits that any value carries.
 *
 * @returns null where some value needs more than 8 digits
 * @example mostSignificantDigits(Float64Array.of(0.125, 3.1416)) // 5
 * @see Goldberg 1991, ACM Computing Surveys 23 (17 digits identify a double)
 */
export function mostSignificantDigits(values: Float64Array): number | null {
  let most = 0;
  for (let i = 0; i < values.length; i++) {
    if (values[i] === 0) continue;
    const digits = digitsOf(values[i]);
    if (digits === null) return null;
    most = Math.max(most, digits);
  }
  return most;
}
