import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { DataError, type Refusal } from "@/benchmarks/scoring/data-error";
import { proposeNodes } from "@/benchmarks/scoring/propose-nodes";
import type { RunScore } from "@/benchmarks/scoring/result";
import { scoreRun } from "@/benchmarks/scoring/score-run";
import { scoreStudy } from "@/benchmarks/scoring/score-study";
import type {
  CheckAnswer,
  CheckFile,
  CheckQuestion,
  CheckStudy,
  FileAnswer,
  StudyAnswer,
} from "./file-check";
import { excerptOf, excerptOfNotFinite } from "./file-excerpt";

/** Reads and scores files beside the page, so that a large one does not stop the typing. Nothing is sent. */

// Files are read one after another: each is held in memory whole only while its turn lasts.
let turn: Promise<void> = Promise.resolve();

self.addEventListener("message", (event: MessageEvent<CheckQuestion>) => {
  const question = event.data;
  turn = turn.then(async () => self.postMessage(await answerTo(question)));
});

/** An unexpected error is reported rather than thrown, so that the next file gets its turn. */
async function answerTo(question: CheckQuestion): Promise<CheckAnswer> {
  try {
    return question.kind === "file" ? await checkFile(question) : checkStudy(question);
  } catch (error) {
    const key = question.kind === "file" ? question.key : null;
    return { kind: "fault", key, serial: question.serial, message: String(error) };
  }
}

async function checkFile({ key, serial, file, problem, declaration, run }: CheckFile): Promise<FileAnswer> {
  const bytes = new Uint8Array(await file.arrayBuffer());
  const answer: FileAnswer = {
    kind: "file",
    key,
    serial,
    sha256: await checksumOf(bytes),
    proposed: null,
    score: null,
    refusal: null,
    excerpt: null,
  };
  const outcome = refusing(run.file, (): Pick<FileAnswer, "proposed" | "score"> => {
    const read = readFieldFile(run.file, bytes);
    const proposed = proposeNodes(problem, read);
    const n = run.n.length > 0 ? run.n : proposed;
    if (!n || !declaration) return { proposed, score: null };
    const attempt = refusing(run.file, () => ({
      score: scoreRun(problem, declaration, { ...run, n }, read) as RunScore | null,
    }));
    return { proposed, score: null, ...attempt };
  });
  Object.assign(answer, outcome);
  if (answer.refusal) answer.excerpt = excerptFrom(bytes, answer.refusal);
  return answer;
}

/** What the file's author can mend is an answer; anything else is a fault of the page and stays an error. */
function refusing<R extends object>(name: string, work: () => R): R | { refusal: Refusal } {
  try {
    return work();
  } catch (error) {
    if (error instanceof DataError) return { refusal: error.toRefusal(name) };
    throw error;
  }
}

function excerptFrom(bytes: Uint8Array, refusal: Refusal): FileAnswer["excerpt"] {
  const isOfText = refusal.where?.startsWith("row ") ?? false;
  const isOfTable = refusal.code === "values/not-finite" && /\.[ct]sv$/i.test(refusal.file ?? "");
  if (!isOfText && !isOfTable) return null;
  const text = new TextDecoder().decode(bytes);
  return isOfText ? excerptOf(text, refusal.where) : excerptOfNotFinite(text);
}

async function checksumOf(bytes: Uint8Array<ArrayBuffer>): Promise<string | null> {
  if (!self.isSecureContext) return null;
  const digest = new Uint8Array(await self.crypto.subtle.digest("SHA-256", bytes));
  return Array.from(digest, (byte) => byte.toString(16).padStart(2, "0")).join("");
}

function checkStudy({ serial, problem, declaration, runs }: CheckStudy): StudyAnswer {
  const { study, findings } = scoreStudy(problem, declaration, runs);
  return { kind: "study", serial, study, findings };
}
