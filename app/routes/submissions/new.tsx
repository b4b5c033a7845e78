import { data, redirect } from "react-router";
import type { TitleBlockEntry } from "@/app/components/layout/title-block";
import { SubmitPage } from "@/app/components/submission/submit-page";
import { requireAccount } from "@/app/features/accounts/viewer-policy";
import { getProblem } from "@/app/features/problems/get-problem.server";
import { listProblems } from "@/app/features/problems/list-problems.server";
import { partFromForm } from "@/app/features/submissions/assemble-part";
import { receiveSubmission, requireSubmitter } from "@/app/features/submissions/receive-submission.server";
import { answerPage, statusOf, toResponse } from "@/app/http/answers.server";
import { viewerContext } from "@/app/http/session.server";
import { uploadLimits } from "@/app/http/upload-limits";
import { receiveUpload } from "@/app/http/upload.server";
import { AppError, type AppErrorKind } from "@/app/platform/errors";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = () => [{ title: "Hand in a refinement study · Backsight" }];

export const handle = {
  titleBlock: ({ problem }: Route.ComponentProps["loaderData"]): TitleBlockEntry => ({
    label: "Sheet",
    value: problem ? `Submission, ${problem.definition.code}` : "Submission",
  }),
};

export async function loader({ request, context }: Route.LoaderArgs) {
  return answerPage(request, async () => {
    const account = requireAccount(context.get(viewerContext));
    const slug = new URL(request.url).searchParams.get("problem");
    const [problems, chosen] = await Promise.all([listProblems(), slug ? getProblem(slug) : null]);
    return {
      problems: problems.map(({ slug, code, title }) => ({ slug, code, title })),
      problem: chosen && { revision: chosen.revision, definition: chosen.definition },
      teams: account.teams,
      isEmailVerified: account.isEmailVerified,
      limits: uploadLimits,
    };
  });
}

/** Refusals that the form shows; the others are pages of their own. */
const shownKinds: AppErrorKind[] = ["invalid", "conflict", "tooLarge", "forbidden", "limitReached"];

export async function action({ request, context }: Route.ActionArgs) {
  const viewer = context.get(viewerContext);
  let values: Record<string, string> = {};
  try {
    requireSubmitter(viewer);
    const { submission, files } = await receiveUpload(request, {
      fromFields: (fields, fileNames) => {
        values = Object.fromEntries(fields);
        return partFromForm(fields, fileNames);
      },
    });
    const { id } = await receiveSubmission(viewer, submission, files);
    return redirect(`/submissions/${id}`);
  } catch (error) {
    if (!(error instanceof AppError) || !shownKinds.includes(error.kind)) throw toResponse(error, request);
    const { fields = {}, refusals = [] } = error.details;
    return data({ message: error.message, fields, refusals, values }, { status: statusOf(error) });
  }
}

export default function NewSubmission({ loaderData, actionData }: Route.ComponentProps) {
  return <SubmitPage {...loaderData} refused={actionData} />;
}
