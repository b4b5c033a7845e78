import { type FormEvent, useSyncExternalStore } from "react";
import { methodFamilies } from "@/drizzle/enums";
import { CostStep } from "./cost-step";
import { DropZone } from "./drop-zone";
import { FilesLedger } from "./files-ledger";
import { GridFields } from "./grid-step";
import { PlainFileRows } from "./plain-file-rows";
import { RefusalNote } from "./refusal-note";
import { ScoreStep } from "./score-step";
import { SolverStep } from "./solver-step";
import { Step } from "./step";
import type { Limits } from "./submit-readiness";
import type { ChosenProblem, Team } from "./submit-state";
import { UploadStep } from "./upload-step";
import type { SubmitFormState } from "./use-submit-form";

interface SubmitFormProps {
  problem: ChosenProblem;
  teams: Team[];
  limits: Limits;
  form: SubmitFormState;
}

/** The form after the problem is chosen. Without a script it posts itself; with one, the files go with progress. */
export function SubmitForm({ problem, teams, limits, form }: SubmitFormProps) {
  const { fields, rows, bind, errorOf, refusals, onRows } = form;
  const isSending = form.progress !== null;
  const isScripted = useIsScripted();
  const family = methodFamilies.find((kind) => kind === fields.get("family")) ?? null;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (form.reasons.length === 0 && !isSending) void form.send();
  };
  return (
    <form method="post" encType="multipart/form-data" onSubmit={submit} noValidate>
      <input type="hidden" name="problem" value={problem.definition.slug} />
      <input type="hidden" name="revision" value={problem.revision} />
      <SolverStep
        bind={bind}
        errorOf={errorOf}
        teams={teams}
        family={fields.get("family") ?? ""}
        claim={fields.get("claim") ?? ""}
      />
      <Step
        id="files"
        title="Grids and files"
        remark="one file for each grid, three grids at least for an order"
      >
        <GridFields
          bind={bind}
          errorOf={errorOf}
          problem={problem.definition}
          reconstruction={fields.get("reconstruction") ?? ""}
        />
        <DropZone
          limits={limits}
          isDisabled={isSending}
          onFiles={(files) => onRows({ type: "add", files })}
        />
        <FilesLedger
          rows={rows}
          answers={form.answers}
          refusals={refusals}
          findings={form.study?.findings ?? []}
          shares={form.shares}
          onChange={onRows}
        />
        <PlainFileRows />
        <div aria-live="polite" className="mt-3 grid gap-2.5 empty:hidden">
          {refusals
            .filter(({ file }) => !rows.some((row) => row.name === file))
            .map((refusal) => (
              <RefusalNote key={refusal.code + refusal.message} refusal={refusal} />
            ))}
        </div>
      </Step>
      <CostStep bind={bind} errorOf={errorOf} rows={rows} isSending={isSending} onChange={onRows} />
      <ScoreStep
        rows={rows}
        answers={form.answers}
        study={form.study}
        family={family}
        outputTime={problem.definition.outputTimes.at(-1) ?? null}
      />
      <UploadStep
        bind={bind}
        errorOf={errorOf}
        files={rows.length}
        reasons={form.reasons}
        isScripted={isScripted}
        progress={form.progress}
        message={form.message}
        onCancel={form.cancel}
      />
    </form>
  );
}

const neverChanges = () => () => undefined;

/** False in what the server sends and until the page's scripts run. */
function useIsScripted(): boolean {
  return useSyncExternalStore(
    neverChanges,
    () => true,
    () => false,
  );
}
