import type { RunRole } from "@/drizzle/enums";

/** One chosen file with what its author declares about it. Texts are as typed. */
export interface UploadRow {
  /** The file's name; a file of the same name replaces the one before. */
  name: string;
  file: File;
  /** Grows with each replacement, so that what was found in the earlier file is not taken for the new one's. */
  generation: number;
  n: string;
  /** The author typed n, so the file no longer proposes it. */
  isNTyped: boolean;
  role: RunRole;
  wall: string;
  unknowns: string;
  dt: string;
  steps: string;
}

export type RowField = "n" | "role" | "wall" | "unknowns" | "dt" | "steps";

export type RowsAction =
  | { type: "add"; files: File[] }
  | { type: "remove"; name: string }
  | { type: "change"; name: string; field: RowField; value: string }
  | { type: "propose"; name: string; n: string };

export function changeRows(rows: UploadRow[], action: RowsAction): UploadRow[] {
  switch (action.type) {
    case "add":
      return action.files.reduce(addFile, rows);
    case "remove":
      return rows.filter((row) => row.name !== action.name);
    case "change":
      return mapRow(rows, action.name, (row) => ({
        ...row,
        [action.field]: action.value,
        isNTyped: row.isNTyped || action.field === "n",
      }));
    case "propose":
      return mapRow(rows, action.name, (row) => (row.isNTyped ? row : { ...row, n: action.n }));
  }
}

function addFile(rows: UploadRow[], file: File): UploadRow[] {
  // The server keeps names in this form; the runs must name their files the same way.
  const name = file.name.normalize("NFC").trim();
  const earlier = rows.find((row) => row.name === name);
  if (earlier) return mapRow(rows, name, (row) => ({ ...row, file, generation: row.generation + 1 }));
  const blank = { generation: 1, n: "", isNTyped: false, role: "study" as const };
  const row = { name, file, ...blank, wall: "", unknowns: "", dt: "", steps: "" };
  return [...rows, row].sort((a, b) => a.name.localeCompare(b.name, "en", { numeric: true }));
}

function mapRow(rows: UploadRow[], name: string, change: (row: UploadRow) => UploadRow): UploadRow[] {
  return rows.map((row) => (row.name === name ? change(row) : row));
}

export function totalBytes(rows: UploadRow[]): number {
  return rows.reduce((sum, row) => sum + row.file.size, 0);
}
