/** What a result file holds, whatever its format, and the limits that every reader is given. */

/**
 * One array of a result file, in row-major order whatever the file's own order was.
 *
 * @example const array: FieldArray = { shape: [3], values: Float64Array.of(1, 2, 3), imaginary: null, numberType: "float64", isFortranOrder: false }
 */
export interface FieldArray {
  /** Lengths of the axes, slowest first; empty for a single number. */
  shape: number[];
  /** Real parts, row-major. */
  values: Float64Array;
  /** Imaginary parts of complex numbers; null for real ones. */
  imaginary: Float64Array | null;
  /** As stored: `float64`, `float32`, `complex128`, `complex64`, `int32`, `int64`, or `text` for a table. */
  numberType: string;
  /** The file was stored column-major. Already undone. */
  isFortranOrder: boolean;
}

/**
 * The arrays of one result file by name.
 *
 * @example readFieldFile("n64.npy", bytes).arrays.get("u")
 */
export interface FieldFile {
  format: "npy" | "npz" | "csv";
  /** Named arrays as found: u, v, ..., x, y, t; the array of a bare NPY file is "u". */
  arrays: Map<string, FieldArray>;
}

/**
 * What a reader may allocate, checked before it does.
 *
 * @example const limits: ReadLimits = { ...defaultLimits, maxBytes: 2 ** 20 }
 */
export interface ReadLimits {
  /** Bytes of the file as sent. */
  maxBytes: number;
  /** Bytes of all its arrays once unpacked, counted as stored and again in double precision. */
  maxUnpackedBytes: number;
  /** Values of one array, all its output times together. The scorer holds the nodes of one time to its own limit. */
  maxNodes: number;
}

/**
 * Limits of an ordinary submission: 64 MiB a file, 256 MiB unpacked, 2^24 values an array.
 *
 * @example readFieldFile("n64.npy", bytes, defaultLimits)
 */
export const defaultLimits: ReadLimits = {
  maxBytes: 64 * 2 ** 20,
  maxUnpackedBytes: 256 * 2 ** 20,
  maxNodes: 2 ** 24,
};
