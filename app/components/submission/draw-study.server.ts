import { convergenceSpec } from "@/app/components/charts/convergence-spec";
import { sizes, type Drawings } from "@/app/components/charts/drawings";
import { renderChart } from "@/app/components/charts/render-chart.server";
import type { SubmissionView } from "@/app/features/submissions/submission-view";
import { studyChartOf } from "./study-curves";
import { outputTimeOf } from "./output-time";

/** The study's chart for the desk and for a telephone, so that the page is whole before any script. */
export async function drawStudy(submission: SubmissionView): Promise<Drawings | undefined> {
  if (!submission.study) return undefined;
  const chart = studyChartOf(submission.studies, submission.family, outputTimeOf(submission));
  const [wide, narrow] = await Promise.all(
    [sizes.record.wide, sizes.record.narrow].map((size) => renderChart(convergenceSpec(chart, size))),
  );
  return { wide, narrow };
}
