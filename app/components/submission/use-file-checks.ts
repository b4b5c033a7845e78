import { type RefObject, useEffect, useMemo, useRef, useState } from "react";
import type { ProblemDefinition } from "@/benchmarks/problems/definition";
import type { Declaration, RunDeclaration } from "@/benchmarks/scoring/declaration";
import type { CheckAnswer, CheckFile, CheckQuestion, FileAnswer, StudyAnswer } from "./file-check";

/** A file to check: what was declared about it changes while its author types. */
export interface FileToCheck {
  key: string;
  file: File;
  run: RunDeclaration;
  /** Null while too little is declared to score it. */
  declaration: Declaration | null;
}

/** "fault" where the check itself broke down. */
export type Checked = FileAnswer | "fault";

export interface FileChecks {
  /** By the file's key: what was read last, of the file as it stands. */
  answers: ReadonlyMap<string, Checked>;
  study: StudyAnswer | null;
}

interface Asked {
  file: File;
  /** What the answer rests on besides the file. */
  rest: string;
  serial: number;
}

type KeptAnswers = ReadonlyMap<string, { file: File; checked: Checked }>;

const restMs = 250;

/** Has the chosen files read and scored by the worker, again whenever what they rest on has changed. */
export function useFileChecks(problem: ProblemDefinition | null, files: FileToCheck[]): FileChecks {
  const [kept, setKept] = useState<KeptAnswers>(new Map());
  const [study, setStudy] = useState<StudyAnswer | null>(null);
  const asked = useRef(new Map<string, Asked>());
  const studySerial = useRef(0);
  const ask = useWorker(asked, (answer) => {
    if (answer.kind === "study") {
      if (answer.serial === studySerial.current) setStudy(answer);
      return;
    }
    const { key } = answer;
    const question = key === null ? undefined : asked.current.get(key);
    if (key === null || question?.serial !== answer.serial) return;
    const checked = answer.kind === "file" ? answer : "fault";
    setKept((before) => new Map(before).set(key, { file: question.file, checked }));
  });

  useEffect(() => {
    if (!problem) return;
    const timer = setTimeout(() => {
      for (const question of questionsOf(problem, files, asked.current)) ask(question);
    }, restMs);
    return () => clearTimeout(timer);
  }, [problem, files, ask]);

  const answers = useMemo(() => currentAnswers(files, kept), [files, kept]);
  const scored = useMemo(() => scoredRuns(files, answers), [files, answers]);
  useEffect(() => {
    studySerial.current += 1;
    if (!problem || !scored) return;
    ask({ kind: "study", serial: studySerial.current, problem, ...scored });
  }, [problem, scored, ask]);

  return { answers, study: scored ? study : null };
}

/** The worker starts with the first question. */
function useWorker(
  asked: RefObject<Map<string, Asked>>,
  listen: (answer: CheckAnswer) => void,
): (question: CheckQuestion) => void {
  const worker = useRef<Worker | null>(null);
  const listener = useRef(listen);
  useEffect(() => {
    listener.current = listen;
  });
  useEffect(() => {
    const questions = asked.current;
    return () => {
      worker.current?.terminate();
      worker.current = null;
      questions.clear();
    };
  }, [asked]);
  const [ask] = useState(() => (question: CheckQuestion) => {
    if (!worker.current) {
      worker.current = new Worker(new URL("./check-files.worker.ts", import.meta.url), { type: "module" });
      worker.current.onmessage = (event: MessageEvent<CheckAnswer>) => listener.current(event.data);
    }
    worker.current.postMessage(question);
  });
  return ask;
}

let lastSerial = 0;

/** What has to be asked anew, noted as asked. */
function questionsOf(
  problem: ProblemDefinition,
  files: FileToCheck[],
  asked: Map<string, Asked>,
): CheckFile[] {
  const questions: CheckFile[] = [];
  for (const { key, file, run, declaration } of files) {
    const rest = restOf(problem, run, declaration);
    const before = asked.get(key);
    if (before?.file === file && before.rest === rest) continue;
    lastSerial += 1;
    asked.set(key, { file, rest, serial: lastSerial });
    questions.push({ kind: "file", key, serial: lastSerial, file, problem, declaration, run });
  }
  return questions;
}

/** Cost and claim change no norm. */
function restOf(problem: ProblemDefinition, run: RunDeclaration, declaration: Declaration | null): string {
  return JSON.stringify([problem.slug, run.n, run.unknowns, declaration && { ...declaration, claim: null }]);
}

/** An answer about a file that was replaced since is none. */
function currentAnswers(files: FileToCheck[], kept: KeptAnswers): FileChecks["answers"] {
  const current = new Map<string, Checked>();
  for (const { key, file } of files) {
    const entry = kept.get(key);
    if (entry?.file === file) current.set(key, entry.checked);
  }
  return current;
}

/** The runs that have a score, with what a study of them needs; null before there is one. */
function scoredRuns(files: FileToCheck[], answers: FileChecks["answers"]) {
  const declaration = files.find((file) => file.declaration)?.declaration;
  if (!declaration) return null;
  const runs = files.flatMap(({ key, run }) => {
    const answer = answers.get(key);
    if (!answer || answer === "fault" || !answer.score) return [];
    return [{ declaration: { ...run, n: answer.score.n }, score: answer.score }];
  });
  return runs.some((run) => run.declaration.role === "study") ? { declaration, runs } : null;
}
