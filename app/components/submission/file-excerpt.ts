import type { Excerpt } from "./file-check";

const longestLine = 120;

/** The rows about "row 94, column 2", as a reader counts them: from 1, header and comments included. */
export function excerptOf(text: string, where: string | null): Excerpt | null {
  const place = /^row (\d+)(?:, column (\d+))?/.exec(where ?? "");
  if (!place) return null;
  const row = Number(place[1]);
  const all = text.split(/\r\n|\n|\r/);
  if (row < 1 || row > all.length) return null;
  const from = Math.max(1, row - 1);
  const lines = all.slice(from - 1, Math.min(all.length, row + 1)).map((line, i) => ({
    number: from + i,
    text: line.length > longestLine ? `${line.slice(0, longestLine)}…` : line,
    isNamed: from + i === row,
  }));
  return { lines, caret: place[2] ? caretOf(all[row - 1], Number(place[2])) : null };
}

function caretOf(line: string, column: number): Excerpt["caret"] {
  const separator = [";", "\t", ","].find((candidate) => line.includes(candidate));
  if (!separator) return { from: 0, length: Math.max(1, Math.min(line.length, longestLine)) };
  const cells = line.split(separator);
  const cell = cells[column - 1];
  if (cell === undefined) return null;
  const before = cells.slice(0, column - 1).reduce((sum, other) => sum + other.length + 1, 0);
  const from = before + (cell.length - cell.trimStart().length);
  return from >= longestLine ? null : { from, length: Math.max(1, cell.trim().length) };
}
