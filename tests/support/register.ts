import { createHash, randomUUID } from "node:crypto";
import { Readable } from "node:stream";
import { ensureAccount } from "@/app/features/accounts/ensure-account.server";
import { loadAccount } from "@/app/features/accounts/load-account.server";
import type { Account } from "@/app/features/accounts/viewer";
import { listSubmission } from "@/app/features/moderation/list-submission.server";
import { scoreStoredSubmission } from "@/app/features/scoring/score-submission.server";
import { handInSubmission } from "@/app/features/submissions/hand-in-submission.server";
import { receiveSubmission } from "@/app/features/submissions/receive-submission.server";
import type { StoredFile } from "@/app/features/submissions/stored-file";
import type { SubmissionPartInput } from "@/app/features/submissions/submission-form";
import { ensureTeam } from "@/app/features/teams/ensure-team.server";
import { putStream } from "@/app/platform/storage.server";
import { writeNpz } from "@/benchmarks/formats/write-npz";
import type { Role } from "@/drizzle/enums";

let serial = 0;

/** A verified account; with a team's name, its owner. */
export async function makeAccount(role: Role = "author", teamName?: string): Promise<Account> {
  serial += 1;
  const email = `person-${serial}-${randomUUID()}@example.test`;
  const { userId } = await ensureAccount({
    name: `Person ${serial}`,
    email,
    password: "a long password",
    role,
  });
  if (teamName) await ensureTeam({ name: teamName, ownerId: userId, isHouse: false });
  const account = await loadAccount(userId, { scopes: null, apiKeyId: null });
  if (!account) throw new Error("The account that was just made is missing.");
  return account;
}

/**
 * A field on the problem `advection-exp-sine`: the exact solution exp(sin(x - 3)) on n periodic nodes of [0, 2 pi), and
 * on top of it an error of the given size and order.
 */
export function advectionFile(n: number, { order = 2, scale = 1 } = {}): Uint8Array {
  const x = Float64Array.from({ length: n }, (_, j) => (2 * Math.PI * j) / n);
  const u = x.map((at) => Math.exp(Math.sin(at - 3)) + scale * n ** -order * Math.cos(2 * at));
  return writeNpz({ x: { shape: [n], values: x }, u: { shape: [n], values: u } });
}

export interface StudyInput {
  team: string;
  solver?: string;
  version?: string;
  nodes?: number[];
  order?: number;
  scale?: number;
  family?: "finiteDifference" | "fourier";
}

export interface StudyToSubmit {
  part: SubmissionPartInput;
  files: Record<string, Uint8Array>;
}

/** A refinement study of the advection problem, as an author would send it. */
export function advectionStudy(input: StudyInput): StudyToSubmit {
  const {
    team,
    solver = "central",
    version = "1.0",
    nodes = [16, 32, 64, 128],
    order = 2,
    scale = 1,
  } = input;
  const nameOf = (n: number) => `n${String(n).padStart(4, "0")}.npz`;
  return {
    files: Object.fromEntries(nodes.map((n) => [nameOf(n), advectionFile(n, { order, scale })])),
    part: {
      problem: "advection-exp-sine",
      solver: { team, solver, version, family: input.family ?? "finiteDifference", method: "central" },
      claim: { kind: "algebraic", order },
      grid: { x: { kind: "uniform-periodic" } },
      dataLicence: "CC-BY-4.0",
      runs: nodes.map((n) => ({ file: nameOf(n), n: [n], wallSeconds: n / 1000 })),
    },
  };
}

export async function storeFiles(files: Record<string, Uint8Array>): Promise<StoredFile[]> {
  return await Promise.all(
    Object.entries(files).map(async ([name, bytes]) => {
      const storageKey = `files/${randomUUID()}`;
      await putStream(storageKey, Readable.from([Buffer.from(bytes)]), {});
      const sha256 = createHash("sha256").update(bytes).digest("hex");
      return { name, sha256, sizeBytes: bytes.byteLength, storageKey };
    }),
  );
}

export async function submit(viewer: Account, { part, files }: StudyToSubmit) {
  return await receiveSubmission(viewer, part, await storeFiles(files));
}

/** The whole path up to review. */
export async function submitForReview(viewer: Account, study: StudyToSubmit): Promise<string> {
  const { id } = await submit(viewer, study);
  await scoreStoredSubmission(id);
  await handInSubmission(viewer, id);
  return id;
}

/** The whole path up to a record. */
export async function submitAndList(viewer: Account, admin: Account, study: StudyToSubmit) {
  const id = await submitForReview(viewer, study);
  return await listSubmission(admin, { id, note: "The evidence holds." });
}
