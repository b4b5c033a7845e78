/** Reads text tables: CSV and TSV files. */

import { defaultLimits, type FieldArray, type ReadLimits } from "./field-file";
import { readColumns } from "./table-columns";
import { arrangeOnGrid } from "./table-grid";
import { decodeTable } from "./table-text";

/**
 * Reads a CSV or TSV table into arrays on the grid that its rows form.
 *
 * Columns are found by the names in the header: x, y, t are coordinates, all others fields. Rows are counted
 * as lines of the file, from 1, comment and blank lines included.
 *
 * @param bytes the whole file
 * @param limits what may be allocated
 * @returns x (and y, t) of shape (N), fields of shape ([Nt,] Nx[, Ny]), row-major
 * @throws DataError the codes of `decodeTable`, `readColumns` and `arrangeOnGrid`, naming row and column
 * @example readTable(new TextEncoder().encode("x,u\n0,1\n0.5,2\n")).get("u")?.values // 1, 2
 * @see RFC 4180
 */
export function readTable(bytes: Uint8Array, limits: ReadLimits = defaultLimits): Map<string, FieldArray> {
  return arrangeOnGrid(readColumns(decodeTable(bytes), limits));
}
