import type { StepState } from "./step-list";
import type { ChosenProblem } from "./submit-state";
import type { SubmitFormState } from "./use-submit-form";

/** What stands in the margin: each step with what it holds so far. */
export function stepsOf(problem: ChosenProblem | null, form: SubmitFormState | null): StepState[] {
  const fields = form?.fields;
  const rows = form?.rows ?? [];
  const solver = fields?.get("solver")?.trim();
  const version = fields?.get("version")?.trim();
  const readable = rows.filter((row) => isReadable(form, row.name)).length;
  const scored = rows.filter((row) => isScored(form, row.name)).length;
  const timed = rows.filter((row) => row.wall.trim() !== "").length;
  const isRead = rows.length > 0 && readable === rows.length;
  return [
    {
      id: "problem",
      title: "Problem",
      summary: problem ? `${problem.definition.code}, revision ${problem.revision}` : "not chosen",
      isDone: problem !== null,
    },
    {
      id: "solver",
      title: "Solver",
      summary: solver ? [solver, version].filter(Boolean).join(", ") : "not named",
      isDone: Boolean(solver && version && fields?.get("family") && fields.get("method")?.trim()),
    },
    {
      id: "files",
      title: "Grids and files",
      summary: rows.length > 0 ? `${readable} of ${rows.length} read` : "no file yet",
      isDone: isRead,
    },
    {
      id: "cost",
      title: "Cost",
      summary: timed > 0 ? `declared for ${timed} run${timed === 1 ? "" : "s"}` : "may be left out",
      isDone: isRead,
    },
    {
      id: "score",
      title: "Score",
      summary: rows.length > 0 ? `${scored} of ${rows.length} scored here` : "in this browser",
      isDone: isRead && scored === rows.length,
    },
    { id: "upload", title: "Upload", summary: "licence, private until listed", isDone: false },
  ];
}

function isReadable(form: SubmitFormState | null, name: string): boolean {
  const answer = form?.answers.get(name);
  return answer !== undefined && (answer === "fault" || answer.refusal === null);
}

function isScored(form: SubmitFormState | null, name: string): boolean {
  const answer = form?.answers.get(name);
  return answer !== undefined && answer !== "fault" && answer.score !== null;
}
