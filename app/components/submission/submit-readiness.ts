import type { z } from "zod";
import { assemblePart, fieldOfPath } from "@/app/features/submissions/assemble-part";
import { submissionPart } from "@/app/features/submissions/submission-form";
import type { Checked } from "./use-file-checks";
import { runFieldsOf, type Fields, type Setting } from "./submit-state";
import { totalBytes, type UploadRow } from "./upload-rows";

export interface Limits {
  fileBytes: number;
  files: number;
  totalBytes: number;
}

const labels: Record<string, string> = {
  team: "the team",
  solver: "the solver's slug",
  solverName: "the solver's name",
  version: "its version",
  family: "the method family",
  method: "the method in a word",
  claim: "what is claimed",
  formalOrder: "the formal order",
  gridX: "the grid along x",
  gridY: "the grid along y",
  reconstruction: "the reconstruction",
  degree: "the degree of the reconstruction",
  dataLicence: "the licence",
};

export interface ReadinessInput {
  fields: Fields;
  rows: UploadRow[];
  answers: ReadonlyMap<string, Checked>;
  setting: Setting;
  limits: Limits;
}

/** What is left to do before the files can be sent, each as the end of "Before they can be sent: ...". */
export function reasonsToWait({ fields, rows, answers, setting, limits }: ReadinessInput): string[] {
  const part = assemblePart(fields, rows.map(runFieldsOf));
  const missing = wrongFields(part).map((name) => labels[name] ?? name);
  if (!fields.get("family")) missing.push(labels.family);
  if (!fields.get("method")?.trim()) missing.push(labels.method);
  const reasons = missing.length > 0 ? [`give ${joined([...new Set(missing)])}`] : [];
  if (rows.length === 0) return [...reasons, "choose the files"];
  return [...reasons, ...fileReasons(rows, answers, setting), ...limitReasons(rows, limits)];
}

/** Fields that the schema refuses, in the order of the schema; those of runs are told beside their files. */
export function wrongFields(part: Record<string, unknown>): string[] {
  const parsed = submissionPart.safeParse(part);
  if (parsed.success) return [];
  return [...new Set(parsed.error.issues.flatMap((issue) => fieldOf(issue) ?? []))];
}

function fieldOf(issue: z.core.$ZodIssue): string | null {
  if (issue.path[0] === "runs") return null;
  const path = issue.path.map(String).join(".");
  return fieldOfPath[path] ?? path;
}

function fileReasons(rows: UploadRow[], answers: ReadonlyMap<string, Checked>, setting: Setting): string[] {
  const reading: string[] = [];
  const refused: string[] = [];
  const without: string[] = [];
  rows.forEach((row, i) => {
    const answer = answers.get(row.name);
    if (!answer) reading.push(row.name);
    else if (answer !== "fault" && answer.refusal) refused.push(row.name);
    else if (setting.runs[i].n.length === 0) without.push(row.name);
  });
  const reasons: string[] = [];
  if (reading.length > 0) reasons.push(`let ${joined(reading)} be read`);
  if (refused.length > 0) reasons.push(`replace or remove ${joined(refused)}`);
  if (without.length > 0) reasons.push(`give N of ${joined(without)}`);
  if (setting.refusals.length > 0) reasons.push("mend what is refused above");
  return reasons;
}

function limitReasons(rows: UploadRow[], limits: Limits): string[] {
  const mebibytes = (bytes: number) => `${bytes / 2 ** 20} MiB`;
  const tooLarge = rows.filter((row) => row.file.size > limits.fileBytes).map((row) => row.name);
  const reasons: string[] = [];
  if (tooLarge.length > 0)
    reasons.push(`leave out ${joined(tooLarge)}, over ${mebibytes(limits.fileBytes)} a file`);
  if (rows.length > limits.files)
    reasons.push(`leave out ${rows.length - limits.files} files, over ${limits.files}`);
  if (totalBytes(rows) > limits.totalBytes)
    reasons.push(`leave out files, over ${mebibytes(limits.totalBytes)} in all`);
  return reasons;
}

/** "a", "a and b", "a, b and 3 more". */
export function joined(words: string[]): string {
  const shown = words.length > 4 ? [...words.slice(0, 3), `${words.length - 3} more`] : words;
  return shown.length < 2 ? (shown[0] ?? "") : `${shown.slice(0, -1).join(", ")} and ${shown.at(-1)}`;
}
