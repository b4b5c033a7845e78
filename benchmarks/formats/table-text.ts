/** Text tables: from bytes to lines, and the separator of their header. */

import { DataError } from "../scoring/data-error";

/**
 * The separators that tables may use.
 *
 * @example const separator: Separator = ";"
 */
export type Separator = "," | ";" | "\t";

const maxRowCharacters = 65536;

const separatorNames: Record<Separator, string> = { ",": "comma", ";": "semicolon", "\t": "tab" };

/**
 * A table's text, ready to be split.
 *
 * @example const table: TableText = decodeTable(new TextEncoder().encode("x,u\n0,1\n"))
 */
export interface TableText {
  /** Lines end in "\n" alone; comment lines are blank, so that line numbers are those of the file. */
  text: string;
  separator: Separator;
  /** 1-based line of the header. */
  headerRow: number;
  rowCount: number;
}

/**
 * Decodes a table and finds the separator that its header uses.
 *
 * @param bytes the whole file, UTF-8 with or without a byte order mark, lines ended by LF, CRLF or CR
 * @returns the text, its separator and the number of its lines
 * @throws DataError `format/not-utf8` naming the byte offset; `format/no-header`, `format/separator`,
 *   `format/quotes` or `format/long-row` naming the row
 * @example decodeTable(new TextEncoder().encode("# run 3\nx;u\n0;1\n")).separator // ";"
 * @see RFC 4180; RFC 3629 (UTF-8)
 */
export function decodeTable(bytes: Uint8Array): TableText {
  let text = decodeUtf8(bytes);
  if (text.includes("\r")) text = text.replace(/\r\n?/g, "\n");
  const firstComment = /^[ \t]*#.*$/m.exec(text)?.[0] ?? null;
  if (firstComment !== null) text = text.replace(/^[ \t]*#.*$/gm, "");
  const start = text.search(/\S/);
  if (start < 0) {
    throw new DataError(
      "format/no-header",
      'The table has no rows. A header such as "x,u" and one row a node are expected.',
      "row 1",
    );
  }
  const rowCount = countLines(text);
  const headerRow = countLines(text.slice(0, start));
  const lineStart = text.lastIndexOf("\n", start) + 1;
  const lineEnd = text.indexOf("\n", start);
  const header = text.slice(lineStart, lineEnd < 0 ? undefined : lineEnd);
  const separator = findSeparator(header, headerRow, firstComment);
  if (text.includes('"')) refuseStrayQuotes(text, separator);
  return { text, separator, headerRow, rowCount };
}

function decodeUtf8(bytes: Uint8Array): string {
  if ((bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff)) {
    throw new DataError("format/not-utf8", "The table is in UTF-16 (byte 0). Save it as UTF-8.", "byte 0");
  }
  if (isUtf8(bytes)) return new TextDecoder().decode(bytes);
  let [good, bad] = [0, bytes.length + 1];
  while (bad - good > 1) {
    const middle = (good + bad) >> 1;
    if (isUtf8(bytes.subarray(0, middle), true)) good = middle;
    else bad = middle;
  }
  // The first bytes of a broken character can still be the start of one: its place is where it begins.
  while (!isUtf8(bytes.subarray(0, good))) good--;
  const found = `0x${bytes[good].toString(16).padStart(2, "0")}`;
  throw new DataError(
    "format/not-utf8",
    `The table is not UTF-8 text: ${found} at byte ${good} belongs to no character. Save it as UTF-8.`,
    `byte ${good}`,
  );
}

/** `mayContinue`: the last character may be cut off. */
function isUtf8(bytes: Uint8Array, mayContinue = false): boolean {
  try {
    new TextDecoder("utf-8", { fatal: true }).decode(bytes, { stream: mayContinue });
    return true;
  } catch (error) {
    if (error instanceof TypeError) return false;
    throw error;
  }
}

function countLines(text: string): number {
  let count = 1;
  let start = 0;
  for (let end = text.indexOf("\n"); end >= 0; end = text.indexOf("\n", start)) {
    if (end - start > maxRowCharacters) throw tooLong(count, end - start);
    count++;
    start = end + 1;
  }
  if (text.length - start > maxRowCharacters) throw tooLong(count, text.length - start);
  return count;
}

function tooLong(row: number, length: number): DataError {
  return new DataError(
    "format/long-row",
    `Row ${row} is ${length} characters long, at most ${maxRowCharacters} are read. Write one row a node.`,
    `row ${row}`,
  );
}

/** Quotation marks may enclose a whole field of one row. */
function refuseStrayQuotes(text: string, separator: Separator): void {
  const field = `(?:"[^"]*"|[^"${separator}]*)`;
  const sound = new RegExp(`^${field}(?:${separator}${field})*$`);
  const lines = text.split("\n");
  const row = 1 + lines.findIndex((line) => line.includes('"') && !sound.test(line));
  if (row === 0) return;
  throw new DataError(
    "format/quotes",
    `Row ${row} has a quotation mark that does not enclose a whole field of this row. Write numbers without quotes.`,
    `row ${row}`,
  );
}

function findSeparator(header: string, row: number, comment: string | null): Separator {
  const found = (Object.keys(separatorNames) as Separator[]).filter((separator) =>
    header.includes(separator),
  );
  if (found.length === 1) return found[0];
  if (found.length > 1) {
    const names = found.map((separator) => separatorNames[separator]).join(" and ");
    throw new DataError(
      "format/separator",
      `The header in row ${row} holds ${names}: which one separates columns is not clear. Use one of comma, ` +
        "semicolon and tab.",
      `row ${row}`,
    );
  }
  const hint =
    comment !== null && /[,;\t]/.test(comment)
      ? " A header behind # is a comment: numpy.savetxt writes it plainly with comments=''."
      : " Columns are separated by comma, semicolon or tab.";
  throw new DataError(
    "format/separator",
    `Row ${row} should be a header such as "x,u" and has a single column, ${JSON.stringify(header.slice(0, 40))}.${hint}`,
    `row ${row}`,
  );
}
