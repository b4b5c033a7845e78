import { checkSubmission } from "@/app/features/submissions/check-submission.server";
import { listMySubmissions } from "@/app/features/submissions/list-submissions.server";
import { receiveSubmission, requireSubmitter } from "@/app/features/submissions/receive-submission.server";
import { answerApi } from "@/app/http/answers.server";
import { idempotencyKeyOf } from "@/app/http/idempotency-key.server";
import { answerRead } from "@/app/http/public-read.server";
import { toScoreJson } from "@/app/http/score-json";
import { viewerContext } from "@/app/http/session.server";
import { toSubmissionSummaryJson } from "@/app/http/submission-json";
import { receiveUpload, withFilesInMemory } from "@/app/http/upload.server";
import type { Route } from "./+types/submissions";

export const loader = ({ request, context }: Route.LoaderArgs) =>
  answerApi(async () => {
    const items = await listMySubmissions(context.get(viewerContext));
    const answer = { items: items.map(toSubmissionSummaryJson), nextCursor: null };
    return answerRead(request, answer, { isPrivate: true });
  });

export const action = ({ request, context }: Route.ActionArgs) =>
  answerApi(async () => {
    // Asked before a byte of the body is read.
    const viewer = requireSubmitter(context.get(viewerContext));
    if (new URL(request.url).searchParams.get("dryRun") === "true") {
      const score = await withFilesInMemory(request, (part, files) => checkSubmission(viewer, part, files));
      return Response.json({ dryRun: true, ...toScoreJson(score) });
    }
    const idempotencyKey = idempotencyKeyOf(request);
    const { submission, files } = await receiveUpload(request);
    const { id, state } = await receiveSubmission(viewer, submission, files, { idempotencyKey });
    const url = `/api/v1/submissions/${id}`;
    return Response.json({ id, state, url }, { status: 201, headers: { Location: url } });
  });
