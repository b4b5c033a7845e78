import { and, desc, eq } from "drizzle-orm";
import { z } from "zod";
import { db } from "@/app/platform/db.server";
import { notFound } from "@/app/platform/errors";
import type { Finding } from "@/benchmarks/scoring/result";
import { scorerVersion as currentScorer } from "@/benchmarks/scoring/scorer-version";
import { studies, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { sameFileCode } from "../scoring/same-file-code";
import {
  loadDecisions,
  loadFindings,
  loadGuards,
  loadRuns,
  loadStudies,
  loadSubmission,
  type LoadedSubmission,
} from "./load-submission.server";
import { canSee, isPublic, permissionsOf } from "./submission-policy";
import type { DecisionView, RecordView, RunView, SubmissionView } from "./submission-view";

/** A submission with everything behind its figures; one that the viewer may not see does not exist. */
export async function getSubmission(viewer: Viewer, id: string): Promise<SubmissionView> {
  const loaded = z.uuid().safeParse(id).success ? await loadSubmission(eq(submissions.id, id)) : null;
  if (!loaded || !canSee(viewer, loaded.submission)) throw notFound("The submission");
  return await toView(viewer, loaded);
}

/** The record at its permanent address, with the versions beside it. */
export async function getRecord(viewer: Viewer, number: number, version: number): Promise<RecordView> {
  const address = { number, version };
  const isAddress = [number, version].every((part) => Number.isInteger(part) && part > 0 && part < 2 ** 31);
  const loaded = isAddress
    ? await loadSubmission(and(eq(submissions.recordNumber, number), eq(submissions.recordVersion, version)))
    : null;
  const listedAt = loaded?.submission.listedAt;
  if (!loaded || !listedAt || !isPublic(loaded.submission.state))
    throw notFound(`The record ${number}/${version}`);
  const [view, versions] = await Promise.all([toView(viewer, loaded), loadVersions(number)]);
  const newest = versions[0];
  const isSuperseded = view.state === "superseded" && newest.version > version;
  return {
    ...view,
    record: address,
    listedAt,
    supersededBy: isSuperseded ? { number, version: newest.version } : null,
    versions,
  };
}

async function loadVersions(number: number): Promise<RecordView["versions"]> {
  const rows = await db
    .select({
      id: submissions.id,
      version: submissions.recordVersion,
      state: submissions.state,
      listedAt: submissions.listedAt,
      scorerVersion: studies.scorerVersion,
    })
    .from(submissions)
    .leftJoin(
      studies,
      and(eq(studies.submissionId, submissions.id), eq(studies.norm, "relL2"), eq(studies.measure, "nodes")),
    )
    .where(eq(submissions.recordNumber, number))
    .orderBy(desc(submissions.recordVersion), desc(studies.createdAt));
  return rows
    .filter((row, index) => rows.findIndex((other) => other.id === row.id) === index)
    .flatMap(({ version, listedAt, state, scorerVersion }) =>
      version === null || listedAt === null ? [] : [{ number, version, state, listedAt, scorerVersion }],
    );
}

async function toView(viewer: Viewer, loaded: LoadedSubmission): Promise<SubmissionView> {
  const { submission, problem, revision, solver, version, team } = loaded;
  const scored = await loadStudies(submission.id, submission.problemRevisionId);
  const [runs, findings, decisions] = await Promise.all([
    loadRuns(submission.id, submission.problemRevisionId, scored.scorerVersion ?? currentScorer),
    scored.scorerVersion === null ? [] : loadFindings(submission.id, scored.scorerVersion),
    loadDecisions(submission.id),
  ]);
  const permissions = permissionsOf(viewer, submission);
  const isInsider = permissions.isOwnTeam || viewer?.role === "admin";
  return {
    id: submission.id,
    number: submission.number,
    state: submission.state,
    problem: {
      ...problem,
      title: revision.definition.title,
      revision: revision.number,
      isCurrentRevision: revision.state === "published",
    },
    solver: { slug: solver.slug, name: solver.name },
    version,
    family: solver.family,
    method: solver.method,
    team,
    declaration: submission.declaration,
    dataLicence: submission.dataLicence,
    createdAt: submission.createdAt,
    scoredAt: submission.scoredAt,
    handedInAt: submission.handedInAt,
    listedAt: submission.listedAt,
    record: recordOf(submission),
    scorerVersion: scored.scorerVersion,
    runs: runs.map(toRunView),
    study: scored.studies.find((study) => study.norm === "relL2" && study.measure === "nodes") ?? null,
    studies: scored.studies,
    findings: await visibleFindings(viewer, findings),
    refusals: submission.refusals ?? [],
    decisions: decisions.filter((decision) => isInsider || isPublicDecision(decision)),
    permissions,
  };
}

/** Notes of a review are between the team and the admins; why a record was withdrawn is for its readers. */
function isPublicDecision(decision: DecisionView): boolean {
  return decision.kind === "withdraw";
}

function recordOf({ recordNumber, recordVersion }: LoadedSubmission["submission"]) {
  return recordNumber === null || recordVersion === null
    ? null
    : { number: recordNumber, version: recordVersion };
}

function toRunView({ run, file, score }: Awaited<ReturnType<typeof loadRuns>>[number]): RunView {
  const { id, n, role, state, refusal, unknowns, dt, steps, wallSeconds, yardstickSeconds } = run;
  const { name, sha256, sizeBytes } = file;
  const declared = { unknowns, dt, steps, wallSeconds, yardstickSeconds };
  return { id, n, role, state, refusal, ...declared, file: { name, sha256, sizeBytes }, score };
}

/** "Same file elsewhere" tells an author only of submissions that the author may see. */
async function visibleFindings(viewer: Viewer, findings: Finding[]): Promise<Finding[]> {
  const mentioned = findings.filter((finding) => finding.code === sameFileCode);
  const guards = await loadGuards([
    ...new Set(mentioned.map((finding) => String(finding.figures.submission))),
  ]);
  const seen = new Set(guards.filter((guard) => canSee(viewer, guard)).map((guard) => guard.id));
  return findings.filter(
    (finding) => finding.code !== sameFileCode || seen.has(String(finding.figures.submission)),
  );
}
