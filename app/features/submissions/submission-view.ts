import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Declaration } from "@/benchmarks/scoring/declaration";
import type { Finding, RunScore, Study, StudyKind, Verdict } from "@/benchmarks/scoring/result";
import type { DecisionKind, MethodFamily, RunRole, RunState, SubmissionState } from "@/drizzle/enums";
import type { ProblemName } from "../problems/problem-view";

export interface RecordAddress {
  number: number;
  version: number;
}

/** One run with its file (the evidence) and, once scored, its norms. */
export interface RunView {
  id: string;
  n: number[];
  role: RunRole;
  state: RunState;
  refusal: Refusal | null;
  unknowns: number | null;
  dt: number | null;
  steps: number | null;
  wallSeconds: number | null;
  yardstickSeconds: number | null;
  file: { name: string; sha256: string; sizeBytes: number };
  score: RunScore | null;
}

export interface DecisionView {
  kind: DecisionKind;
  note: string;
  createdAt: Date;
}

/** What the viewer may do; the use-cases check the same rules again. */
export interface SubmissionPermissions {
  canHandIn: boolean;
  canDecide: boolean;
  canWithdraw: boolean;
  isOwnTeam: boolean;
}

export interface SubmissionView {
  id: string;
  /** Shown as S-1001. */
  number: number;
  state: SubmissionState;
  problem: ProblemName & { revision: number; isCurrentRevision: boolean };
  solver: { slug: string; name: string };
  version: { version: string; description: string };
  family: MethodFamily;
  method: string;
  team: { slug: string; name: string; isHouse: boolean };
  declaration: Declaration;
  dataLicence: string;
  createdAt: Date;
  scoredAt: Date | null;
  handedInAt: Date | null;
  listedAt: Date | null;
  /** Null before it is listed. */
  record: RecordAddress | null;
  /** The version of the scorer behind the figures; null before they exist. */
  scorerVersion: string | null;
  runs: RunView[];
  /** The headline: relative L2 at the nodes. */
  study: Study | null;
  studies: Study[];
  findings: Finding[];
  /** Why the files could not be scored, where the state is failed. */
  refusals: Refusal[];
  decisions: DecisionView[];
  permissions: SubmissionPermissions;
}

/** A record: the same at its permanent address, with what became of it. */
export interface RecordView extends SubmissionView {
  record: RecordAddress;
  listedAt: Date;
  supersededBy: RecordAddress | null;
  /** All versions under this number, newest first. */
  versions: (RecordAddress & { state: SubmissionState; listedAt: Date; scorerVersion: string | null })[];
}

/** One line of a list of submissions. */
export interface SubmissionSummary {
  id: string;
  number: number;
  state: SubmissionState;
  problem: ProblemName;
  solver: { slug: string; name: string };
  version: string;
  family: MethodFamily;
  method: string;
  team: { slug: string; name: string; isHouse: boolean };
  record: RecordAddress | null;
  runs: number;
  /** Null before it is scored. */
  observed: { kind: StudyKind; order: number | null; rate: number | null; verdict: Verdict } | null;
  createdAt: Date;
  handedInAt: Date | null;
  listedAt: Date | null;
}

/** One line of the list of records. */
export interface RecordSummary extends SubmissionSummary {
  record: RecordAddress;
  listedAt: Date;
}
