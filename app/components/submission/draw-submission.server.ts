import { drawChart } from "@/app/components/charts/draw-chart.server";
import type { Drawings } from "@/app/components/charts/drawings";
import { chartOfStudies } from "@/app/components/record/record-chart";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import { outputTimeOf } from "./output-time";

/** The study's chart as the server draws it; undefined before there is a study. */
export async function drawSubmission(submission: SubmissionView): Promise<Drawings | undefined> {
  if (!submission.study) return undefined;
  const { studies, family } = submission;
  return await drawChart(chartOfStudies(studies, family, outputTimeOf(submission), null), "record");
}
