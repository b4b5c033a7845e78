/** The columns of a text table, as numbers. */

import Papa from "papaparse";

import { DataError } from "../scoring/data-error";

import type { ReadLimits } from "./field-file";
import { readTableNumber } from "./table-number";
import type { TableText } from "./table-text";

/**
 * The columns of a table in the order of the file.
 *
 * @example const columns: TableColumns = { names: ["x", "u"], values: [x, u], rows: Uint32Array.of(2, 3), headerRow: 1 }
 */
export interface TableColumns {
  names: string[];
  /** One array for each column, as long as `rows`. */
  values: Float64Array[];
  /** 1-based line of the file for each row of values. */
  rows: Uint32Array;
  headerRow: number;
}

/**
 * Splits a table and reads its fields as numbers.
 *
 * @param table from `decodeTable`
 * @param limits what may be allocated: columns times lines are checked before
 * @returns the columns under their header names
 * @throws DataError `format/bad-header`, `format/column-count`, `format/not-a-number`,
 *   `format/decimal-comma`, `format/too-many-values` or `format/too-large`, naming row and column
 * @example readColumns(decodeTable(bytes), defaultLimits).names // ["x", "u"]
 * @see RFC 4180
 */
export function readColumns(table: TableText, limits: ReadLimits): TableColumns {
  const reader = new ColumnReader(table, limits);
  Papa.parse<string[]>(table.text, {
    delimiter: table.separator,
    newline: "\n",
    step: ({ data }) => reader.takeRow(data),
  });
  return reader.finish();
}

const maxColumns = 64;

const decimalHint =
  "Decimal commas are read only where semicolons separate the columns: write decimal points, or separate by " +
  "semicolons.";

class ColumnReader {
  private names: string[] | null = null;
  private values: Float64Array[] = [];
  private rows = new Uint32Array(0);
  private count = 0;
  private row = 0;
  /** Where each decimal mark was met first. */
  private readonly firstMark: { point: string | null; comma: string | null } = { point: null, comma: null };

  constructor(
    private readonly table: TableText,
    private readonly limits: ReadLimits,
  ) {}

  takeRow(fields: string[]): void {
    this.row++;
    if (fields.length === 1 && fields[0].trim() === "") return;
    if (this.names === null) this.takeHeader(fields);
    else this.takeNumbers(fields, this.names);
  }

  finish(): TableColumns {
    if (this.names === null || this.count === 0) {
      throw new DataError(
        "format/no-rows",
        `The table ends at row ${this.row} without a row of numbers. One row a node is expected.`,
        `row ${this.row}`,
      );
    }
    return {
      names: this.names,
      values: this.values.map((column) => column.subarray(0, this.count)),
      rows: this.rows.subarray(0, this.count),
      headerRow: this.table.headerRow,
    };
  }

  private takeHeader(fields: string[]): void {
    if (fields.length > maxColumns) {
      throw this.headerError(`has ${fields.length} columns, at most ${maxColumns} are read`, maxColumns + 1);
    }
    const names = fields.map((field) => field.trim());
    names.forEach((name, index) => {
      const column = index + 1;
      if (!/^[\p{L}_][\p{L}\p{N}_]{0,63}$/u.test(name)) throw this.badName(name, column);
      if (names.indexOf(name) < index) {
        throw this.headerError(`names two columns "${name}", the second is column ${column}`, column);
      }
    });
    const most = this.table.rowCount - this.row;
    this.checkLimits(most, names.length);
    this.names = names;
    this.values = names.map(() => new Float64Array(most));
    this.rows = new Uint32Array(most);
  }

  private takeNumbers(fields: string[], names: string[]): void {
    if (fields.length !== names.length) throw this.wrongCount(fields, names);
    for (let i = 0; i < fields.length; i++) {
      const field = fields[i].trim();
      const reading = readTableNumber(field);
      if ("problem" in reading) {
        const place = this.placeOf(i, names);
        throw new DataError("format/not-a-number", `${place.text}: ${reading.problem}.`, place.where);
      }
      if (reading.mark !== null) this.checkMark(reading.mark, field, i, names);
      this.values[i][this.count] = reading.value;
    }
    this.rows[this.count++] = this.row;
  }

  private placeOf(index: number, names: string[]): { where: string; text: string } {
    const column = `column ${index + 1} (${names[index]})`;
    return { where: `row ${this.row}, ${column}`, text: `Row ${this.row}, ${column}` };
  }

  private checkMark(mark: "point" | "comma", field: string, index: number, names: string[]): void {
    if (mark === "comma" && this.table.separator !== ";") {
      const { text, where } = this.placeOf(index, names);
      const found = `${text}: "${field}" has a decimal comma. ${decimalHint}`;
      throw new DataError("format/decimal-comma", found, where);
    }
    this.firstMark[mark] ??= this.placeOf(index, names).where;
    const other = this.firstMark[mark === "point" ? "comma" : "point"];
    if (other === null) return;
    const { text, where } = this.placeOf(index, names);
    throw new DataError(
      "format/decimal-comma",
      `${text}: "${field}" has a decimal ${mark}, while ${other} has the other mark. Use one decimal mark in the ` +
        "whole file and no thousands separators.",
      where,
    );
  }

  private checkLimits(most: number, columnCount: number): void {
    if (most > this.limits.maxNodes) {
      throw new DataError(
        "format/too-many-values",
        `The table has ${most} lines below its header, at most ${this.limits.maxNodes} are read.`,
        `row ${this.row}`,
      );
    }
    // Once as columns and once as a grid.
    const needed = 2 * 8 * most * columnCount;
    if (needed > this.limits.maxUnpackedBytes) {
      throw new DataError(
        "format/too-large",
        `The table's ${most} lines of ${columnCount} columns take ${needed} bytes in double precision, at most ` +
          `${this.limits.maxUnpackedBytes} are unpacked from one file. NPZ files take half of that.`,
        `row ${this.row}`,
      );
    }
  }

  private wrongCount(fields: string[], names: string[]): DataError {
    const looksDecimal = this.table.separator === "," && fields.length > names.length;
    const hint = looksDecimal
      ? decimalHint
      : "Write every row with the columns of the header, and no separator at its end.";
    return new DataError(
      "format/column-count",
      `Row ${this.row} has ${fields.length} columns, the header names ${names.length} (${names.join(", ")}). ${hint}`,
      `row ${this.row}, column ${Math.min(fields.length, names.length) + 1}`,
    );
  }

  private badName(name: string, column: number): DataError {
    const shown = JSON.stringify(name.slice(0, 40));
    if (name === "") {
      return this.headerError(
        `has no name for column ${column} (pandas writes its index so: index=False leaves it out)`,
        column,
      );
    }
    if (!("problem" in readTableNumber(name))) {
      return this.headerError(`begins with the number ${shown} instead of a name`, column);
    }
    return this.headerError(
      `names column ${column} ${shown}; names are letters, digits and underscores`,
      column,
    );
  }

  private headerError(found: string, column: number): DataError {
    return new DataError(
      "format/bad-header",
      `Row ${this.row} is the header and ${found}. Expected were names such as x,u or x,y,t,u (numpy.savetxt ` +
        "writes them with header='x,u', comments='').",
      `row ${this.row}, column ${column}`,
    );
  }
}
