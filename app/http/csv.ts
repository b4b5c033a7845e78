export type CsvValue = string | number | boolean | null;

/** RFC 4180: a header line, then one line a row; null is an empty cell. */
export function toCsv<Row>(columns: Record<string, (row: Row) => CsvValue>, rows: Row[]): string {
  const lines = [Object.keys(columns), ...rows.map((row) => Object.values(columns).map((read) => read(row)))];
  return lines.map((line) => `${line.map(cell).join(",")}\r\n`).join("");
}

function cell(value: CsvValue): string {
  if (value === null) return "";
  if (typeof value !== "string") return String(value);
  // A spreadsheet would run a text that begins like a formula.
  const text = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
