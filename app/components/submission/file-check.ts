import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import type { Finding, RunScore, Study } from "@/benchmarks/scoring/result";

/** Lines of a text file about the place that a refusal names. */
export interface Excerpt {
  lines: { number: number; text: string; isNamed: boolean }[];
  /** "Row 94, column 2". */
  place: string;
  /** Where the named column begins in its line, and how long it is; null where only a row is named. */
  caret: { from: number; length: number } | null;
}

/** Asks the checking worker to read one file and, where enough is declared, to score it. */
export interface CheckFile {
  kind: "file";
  key: string;
  /** Answers to an earlier question about the same file are dropped. */
  serial: number;
  file: File;
  problem: ProblemDefinition;
  declaration: Declaration | null;
  /** Nodes as declared; empty for the ones proposed from the file. */
  run: RunDeclaration;
}

export interface CheckStudy {
  kind: "study";
  serial: number;
  problem: ProblemDefinition;
  declaration: Declaration;
  runs: { declaration: RunDeclaration; score: RunScore }[];
}

export type CheckQuestion = CheckFile | CheckStudy;

export interface FileAnswer {
  kind: "file";
  key: string;
  serial: number;
  /** Null where the page is not served in a secure context. */
  sha256: string | null;
  proposed: number[] | null;
  score: RunScore | null;
  refusal: Refusal | null;
  excerpt: Excerpt | null;
}

export interface StudyAnswer {
  kind: "study";
  serial: number;
  study: Study | null;
  findings: Finding[];
}

/** The check itself broke down; the server will read the file all the same. */
export interface FaultAnswer {
  kind: "fault";
  key: string | null;
  serial: number;
  message: string;
}

export type CheckAnswer = FileAnswer | StudyAnswer | FaultAnswer;
