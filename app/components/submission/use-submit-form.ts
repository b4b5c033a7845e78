import { type ChangeEvent, useCallback, useMemo, useReducer, useRef, useState } from "react";
import { useNavigate } from "react-router";
import { assemblePart, fieldOfPath } from "@/app/features/submissions/assemble-part";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Binding } from "./field-binding";
import { shareSent, type SendOutcome, type SubmitRefusal } from "./send-submission";
import { reasonsToWait, type Limits } from "./submit-readiness";
import {
  completeFields,
  initialFields,
  runFieldsOf,
  settingOf,
  type ChosenProblem,
  type Team,
} from "./submit-state";
import { changeRows, totalBytes, type RowsAction } from "./upload-rows";
import { useFileChecks } from "./use-file-checks";
import { useLeaveGuard, useSending } from "./use-sending";

interface SubmitFormInput {
  problem: ChosenProblem;
  teams: Team[];
  limits: Limits;
  /** What the server refused of a form that was sent without a script. */
  refused: SubmitRefusal | undefined;
}

/** Everything that the form at /submit knows and does. */
export function useSubmitForm({ problem, teams, limits, refused }: SubmitFormInput) {
  const [typed, setTyped] = useState(() => initialFields(teams, refused?.values));
  const [rows, dispatch] = useReducer(changeRows, []);
  const [refusal, setRefusal] = useState<Omit<SubmitRefusal, "values"> | null>(refused ?? null);
  const sending = useSending();
  const navigate = useNavigate();
  const isHandedOver = useRef(false);

  const fields = useMemo(() => completeFields(typed, problem), [typed, problem]);
  const setting = useMemo(() => settingOf(fields, rows, problem.definition), [fields, rows, problem]);
  const toCheck = useMemo(
    () =>
      rows.map((row, i) => {
        // Where the file proposes n, the check takes it from there and need not be asked again once it stands here.
        const run = row.isNTyped ? setting.runs[i] : { ...setting.runs[i], n: [] };
        const isRefused = setting.refusals.some(({ file }) => file === null || file === row.name);
        return { key: row.name, file: row.file, run, declaration: isRefused ? null : setting.declaration };
      }),
    [rows, setting],
  );
  const { answers, study } = useFileChecks(problem.definition, toCheck);
  const reasons = reasonsToWait({ fields, rows, answers, setting, limits });

  // The file's own N fills the field until its author types another.
  for (const row of rows) {
    const answer = answers.get(row.name);
    const proposed = answer && answer !== "fault" ? answer.proposed?.join(" x ") : undefined;
    if (proposed && !row.isNTyped && row.n !== proposed)
      dispatch({ type: "propose", name: row.name, n: proposed });
  }

  const onRows = useCallback((action: RowsAction) => {
    dispatch(action);
    // What the server said of a file does not hold for the one that replaces it.
    const names =
      action.type === "add"
        ? action.files.map((file) => file.name)
        : [action.type === "remove" ? action.name : ""];
    setRefusal(
      (before) =>
        before && {
          ...before,
          message: "",
          refusals: before.refusals.filter(({ file }) => !file || !names.includes(file)),
        },
    );
  }, []);

  const bind = (name: string): Binding => ({
    name,
    value: fields.get(name) ?? "",
    onChange: (event: ChangeEvent<{ value: string }>) => {
      setTyped((before) => new Map(before).set(name, event.target.value));
      setRefusal((before) => before && { ...before, fields: withoutField(before.fields, name) });
    },
  });

  useLeaveGuard(useCallback(() => rows.length > 0 && !isHandedOver.current, [rows.length]));

  const send = async () => {
    setRefusal(null);
    const part = assemblePart(fields, rows.map(runFieldsOf));
    const outcome = await sending.send(`/submit?problem=${problem.definition.slug}`, part, rows);
    if (outcome.kind === "received") {
      isHandedOver.current = true;
      await navigate(outcome.address);
    } else {
      setRefusal(
        refusalOf(
          outcome,
          rows.map((row) => row.name),
        ),
      );
    }
  };

  const sizes = rows.map((row) => row.file.size);
  const shares = sending.sentBytes === null ? null : shareSent(sizes, sending.sentBytes);
  return {
    fields,
    rows,
    setting,
    answers,
    study,
    reasons,
    bind,
    errorOf: (name: string) => errorsOf(refusal).get(name),
    message: refusal?.message || null,
    refusals: [...setting.refusals, ...(refusal?.refusals ?? [])],
    shares: shares && new Map(rows.map((row, i) => [row.name, shares[i]])),
    progress:
      sending.sentBytes === null ? null : Math.min(1, sending.sentBytes / Math.max(1, totalBytes(rows))),
    onRows,
    send,
    cancel: sending.cancel,
  };
}

export type SubmitFormState = ReturnType<typeof useSubmitForm>;

function refusalOf(outcome: Exclude<SendOutcome, { kind: "received" }>, names: string[]) {
  if (outcome.kind === "cancelled") return null;
  if (outcome.kind === "broken") return { message: outcome.message, fields: {}, refusals: [] };
  const { message, fields, refusals } = outcome.refusal;
  return { message, fields, refusals: [...refusals, ...runRefusals(fields, names)] };
}

/** A sentence about `runs[2].n` belongs beside the third file. */
function runRefusals(fields: Record<string, string>, names: string[]): Refusal[] {
  return Object.entries(fields).flatMap(([path, message]) => {
    const match = /^runs\[(\d+)\]\.?(.*)$/.exec(path);
    const file = match ? names[Number(match[1])] : undefined;
    return match && file ? [{ code: "run/invalid", message, file, where: match[2] || null }] : [];
  });
}

function errorsOf(refusal: Omit<SubmitRefusal, "values"> | null): Map<string, string> {
  return new Map(
    Object.entries(refusal?.fields ?? {}).map(([path, sentence]) => [fieldOfPath[path] ?? path, sentence]),
  );
}

function withoutField(fields: Record<string, string>, name: string): Record<string, string> {
  return Object.fromEntries(Object.entries(fields).filter(([path]) => fieldOfPath[path] !== name));
}
