import { getSubmission } from "@/app/features/submissions/get-submission.server";
import { answerApi } from "@/app/http/answers.server";
import { answerRead } from "@/app/http/public-read.server";
import { viewerContext } from "@/app/http/session.server";
import { toSubmissionJson } from "@/app/http/submission-json";
import type { Route } from "./+types/submission";

export const loader = ({ request, params, context }: Route.LoaderArgs) =>
  answerApi(async () => {
    const viewer = context.get(viewerContext);
    const submission = await getSubmission(viewer, params.id);
    // What a team and the admins see beside it (notes of a review) is not for shared caches.
    return answerRead(request, toSubmissionJson(submission), { isPrivate: viewer !== null });
  });
