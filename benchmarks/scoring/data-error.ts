/** One refusal of submitted data, as the API answers it and the pages show it. */
export interface Refusal {
  /** Stable code, `area/what`: `format/bad-magic`, `grid/not-monotone`, `values/not-finite`. */
  code: string;
  /** What was found, where, what was expected and what to do, in whole sentences. */
  message: string;
  /** File name as the author gave it; null where no single file is to blame. */
  file: string | null;
  /** Row and column, entry name, dataset path, index or byte offset; null where the whole file is meant. */
  where: string | null;
}

/**
 * Thrown for anything that a submitter can cause: a malformed file, a wrong shape, a value that is not finite.
 *
 * Preconditions of our own code throw `RangeError` instead.
 *
 * @example throw new DataError("values/not-finite", "The value is NaN at index 17; ...", "index 17")
 */
export class DataError extends Error {
  readonly code: string;
  readonly where: string | null;

  constructor(code: string, message: string, where: string | null = null) {
    super(message);
    this.name = "DataError";
    this.code = code;
    this.where = where;
  }

  /** The refusal for the file it was met in. */
  toRefusal(file: string | null): Refusal {
    return { code: this.code, message: this.message, file, where: this.where };
  }
}
