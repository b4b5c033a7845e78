import { setImmediate } from "node:timers/promises";
import { refusedData } from "@/app/platform/errors";
import { finestNodes } from "@/benchmarks/scoring/between-nodes";
import { checkDeclaration } from "@/benchmarks/scoring/check-declaration";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Finding, RunScore, Study } from "@/benchmarks/scoring/result";
import { scorerVersion } from "@/benchmarks/scoring/scorer-version";
import { scoreStudy } from "@/benchmarks/scoring/score-study";
import { findRevision, type FoundRevision } from "../problems/find-revision.server";
import { matchFiles } from "../submissions/match-files";
import { parsePart } from "../submissions/parse-part";
import {
  declarationPart,
  toDeclaration,
  toRunDeclarations,
  type DeclarationPart,
} from "../submissions/submission-form";
import { scoreBytes } from "./score-bytes";

export interface ScoreAnswer {
  problem: string;
  revision: number;
  scorer: string;
  /** In the order sent. */
  runs: RunScore[];
  study: Study;
  studies: Study[];
  findings: Finding[];
}

export interface FileBytes {
  name: string;
  bytes: Uint8Array;
}

/** Scores files without an account and without storing anything. */
export async function scoreFiles(part: unknown, files: FileBytes[]): Promise<ScoreAnswer> {
  const parsed = parsePart(declarationPart, part);
  const revision = await findRevision(parsed.problem, parsed.revision ?? null);
  return await scorePart(revision, parsed, parsed.claim ?? { kind: "none" }, files);
}

/** The same once problem and claim are known. All refusals are reported together. */
export async function scorePart(
  revision: FoundRevision,
  part: DeclarationPart,
  claim: NonNullable<DeclarationPart["claim"]>,
  files: FileBytes[],
): Promise<ScoreAnswer> {
  const declaration = toDeclaration(part, claim);
  const runs = toRunDeclarations(part);
  const { matched, refusals } = matchFiles(runs, files);
  refusals.unshift(...checkDeclaration(revision.definition, declaration, runs));
  if (refusals.length > 0) throw refusedData(refusals);
  const scores: RunScore[] = [];
  const refused: Refusal[] = [];
  for (const [index, run] of runs.entries()) {
    // Between files other requests get their turn.
    await setImmediate();
    const outcome = scoreBytes(
      revision.definition,
      declaration,
      run,
      matched[index].bytes,
      finestNodes(runs),
    );
    if (outcome.score) scores.push(outcome.score);
    else refused.push(outcome.refusal);
  }
  if (refused.length > 0) throw refusedData(refused);
  const { study, studies, findings } = scoreStudy(
    revision.definition,
    declaration,
    scores.map((score, index) => ({ declaration: runs[index], score })),
  );
  return {
    problem: revision.slug,
    revision: revision.number,
    scorer: scorerVersion,
    runs: scores,
    study,
    studies,
    findings,
  };
}
