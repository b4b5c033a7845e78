import type { Excerpt } from "./file-check";

const longestLine = 120;

/** The rows about "row 94, column 2", as a reader counts them: from 1, header and comments included. */
export function excerptOf(text: string, where: string | null): Excerpt | null {
  const place = /^row (\d+)(?:, column (\d+))?/.exec(where ?? "");
  return place ? cut(linesOf(text), Number(place[1]), place[2] ? Number(place[2]) : null) : null;
}

const notFinite = /^[-+]?(nan|inf|infinity)$/i;

/** The rows about the first value of a table that is no finite number; the scorer names it by its index only. */
export function excerptOfNotFinite(text: string): Excerpt | null {
  const all = linesOf(text);
  for (const [i, line] of all.entries()) {
    if (line.startsWith("#")) continue;
    const column = cellsOf(line).findIndex((cell) => notFinite.test(cell.trim()));
    if (column >= 0) return cut(all, i + 1, column + 1);
  }
  return null;
}

function linesOf(text: string): string[] {
  return text.split(/\r\n|\n|\r/);
}

function cut(all: string[], row: number, column: number | null): Excerpt | null {
  if (row < 1 || row > all.length) return null;
  const from = Math.max(1, row - 1);
  const lines = all.slice(from - 1, Math.min(all.length, row + 1)).map((line, i) => ({
    number: from + i,
    text: line.length > longestLine ? `${line.slice(0, longestLine)}…` : line,
    isNamed: from + i === row,
  }));
  const place = `Row ${row}${column === null ? "" : `, column ${column}`}`;
  return { place, lines, caret: column === null ? null : caretOf(all[row - 1], column) };
}

function caretOf(line: string, column: number): Excerpt["caret"] {
  const cells = cellsOf(line);
  const cell = cells[column - 1];
  if (cell === undefined) return null;
  const before = cells.slice(0, column - 1).reduce((sum, other) => sum + other.length + 1, 0);
  const from = before + (cell.length - cell.trimStart().length);
  return from >= longestLine ? null : { from, length: Math.max(1, cell.trim().length) };
}

function cellsOf(line: string): string[] {
  const separator = [";", "\t", ","].find((candidate) => line.includes(candidate));
  return separator ? line.split(separator) : [line];
}
