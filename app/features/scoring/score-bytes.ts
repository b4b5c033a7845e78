import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import { DataError, type Refusal } from "@/benchmarks/scoring/data-error";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import type { RunScore } from "@/benchmarks/scoring/result";
import { scoreRun } from "@/benchmarks/scoring/score-run";

export type RunOutcome = { score: RunScore; refusal: null } | { score: null; refusal: Refusal };

/** Reads one file and scores it, `finest` being the nodes of the finest run along each axis; what the submitter can mend comes back as a refusal. */
export function scoreBytes(
  problem: ProblemDefinition,
  declaration: Declaration,
  run: RunDeclaration,
  bytes: Uint8Array,
  finest: readonly number[],
): RunOutcome {
  try {
    return {
      score: scoreRun(problem, declaration, run, readFieldFile(run.file, bytes), finest),
      refusal: null,
    };
  } catch (error) {
    if (error instanceof DataError) return { score: null, refusal: error.toRefusal(run.file) };
    throw error;
  }
}
