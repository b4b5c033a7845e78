/** Numbers as they stand in text files: C, Python, Fortran and MATLAB notation. */

/**
 * A number read from text, or why it is none.
 *
 * @example const reading: NumberReading = readTableNumber("1.0D-03") // { value: 0.001, mark: "point" }
 */
export type NumberReading =
  /** `mark` is what separates whole and fraction; null where there is no fraction. */
  { value: number; mark: "point" | "comma" | null } | { problem: string };

// A double needs at most 17 digits; some programs write many more.
const maxCharacters = 128;

const plain = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?$/;
const foreign = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eEdDqQ][+-]?\d+)?$/;
// Fortran drops the letter where the exponent has three digits: 3.14-114.
const withoutLetter = /^([+-]?(?:\d+[.,]\d*|[.,]\d+))([+-]\d{3})$/;
const notFinite = /^([+-]?)(nan|inf|infinity)$/i;

/**
 * Reads one number.
 *
 * Fortran exponents (`1.0D-03`, `3.14-114`), decimal commas, NaN and infinities are understood; whether a
 * comma is acceptable is the caller's decision. The nearest double is returned, as IEEE 754 demands.
 *
 * @param text the field without surrounding white space
 * @returns the value and its decimal mark, or what is wrong with the text
 * @example readTableNumber("3.14-114") // { value: 3.14e-114, mark: "point" }
 * @see ISO/IEC 1539-1:2018, 13.7.2.3.2 (F, E and D editing)
 */
export function readTableNumber(text: string): NumberReading {
  if (text.length > maxCharacters) return { problem: describe(text) };
  if (plain.test(text)) return { value: Number(text), mark: text.includes(".") ? "point" : null };
  if (foreign.test(text)) {
    return { value: Number(text.replace(",", ".").replace(/[dDqQ]/, "e")), mark: markOf(text) };
  }
  const bare = withoutLetter.exec(text);
  if (bare) return { value: Number(`${bare[1].replace(",", ".")}e${bare[2]}`), mark: markOf(text) };
  const special = notFinite.exec(text);
  if (special) {
    const magnitude = special[2].toLowerCase() === "nan" ? Number.NaN : Number.POSITIVE_INFINITY;
    return { value: special[1] === "-" ? -magnitude : magnitude, mark: null };
  }
  return { problem: describe(text) };
}

function markOf(text: string): "point" | "comma" | null {
  if (text.includes(".")) return "point";
  return text.includes(",") ? "comma" : null;
}

function describe(text: string): string {
  if (text === "") return "The field is empty. A number is expected in every row";
  const shown = JSON.stringify(text.length > 40 ? `${text.slice(0, 40)}...` : text);
  if (/^\*+$/.test(text)) return `${shown} is what Fortran prints where a format is too narrow. Widen it`;
  if (/[.,].*[.,]/.test(text) && /^[\d.,+-]+$/.test(text)) {
    return `${shown} is not a number. Write it without thousands separators`;
  }
  return `${shown} is not a number. Numbers such as 1.25, -3.0e-7 or 1.0D-03 are read`;
}
