import { eq, sql } from "drizzle-orm";
import { afterAll, beforeAll, expect, it } from "vitest";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import type { StudyToSubmit } from "../support/register";
import { db } from "@/app/platform/db.server";
import { writeNpy } from "@/benchmarks/formats/write-npy";
import { runs, runScores, studies, submissions } from "@/drizzle/schema";
import { endProcess, startApplication, type Application } from "../support/application";
import { useDatabase } from "../support/database";
import { makeAccount, submit } from "../support/register";
import { until } from "../support/until";

useDatabase();

let application: Application;

beforeAll(async () => {
  await publishShippedProblems();
  application = await startApplication();
});

afterAll(async () => {
  await application.stop();
});

const nodes = [64, 128, 256, 320, 384, 448, 512, 576, 640, 704, 768, 832];

/** Plane grids that are slow enough to score that a worker can be caught at it. */
function slowStudy(): StudyToSubmit {
  const nameOf = (n: number) => `n${String(n).padStart(4, "0")}.npy`;
  const field = (n: number) => {
    const values = Float64Array.from({ length: n * n }, (_, i) => Math.sin(i / n) + Math.cos(i % n));
    return writeNpy({ shape: [n, n], values });
  };
  return {
    files: Object.fromEntries(nodes.map((n) => [nameOf(n), field(n)])),
    part: {
      problem: "helmholtz-periodic-2d",
      solver: {
        team: "fault-group",
        solver: "slow",
        version: "1",
        family: "fourier",
        method: "pseudospectral",
      },
      claim: { kind: "none" },
      grid: { x: { kind: "uniform-periodic" }, y: { kind: "uniform-periodic" } },
      reconstruction: { kind: "trigonometric" },
      dataLicence: "CC0-1.0",
      runs: nodes.map((n) => ({ file: nameOf(n), n: [n, n] })),
    },
  };
}

async function countScores(submissionId: string): Promise<{ scores: number; scoredRuns: number }> {
  const [counted] = await db
    .select({
      scores: sql<number>`count(${runScores.id})::int`,
      scoredRuns: sql<number>`count(distinct ${runScores.runId})::int`,
    })
    .from(runScores)
    .innerJoin(runs, eq(runs.id, runScores.runId))
    .where(eq(runs.submissionId, submissionId));
  return counted;
}

const stateOf = async (id: string) =>
  (await db.select({ state: submissions.state }).from(submissions).where(eq(submissions.id, id)))[0].state;

it("a worker killed while it scores loses nothing: the next one ends the work, once", async () => {
  const author = await makeAccount("author", "Fault Group");
  const { id } = await submit(author, slowStudy());

  const killed = await application.startWorker();
  await until("a first run is scored", async () => (await countScores(id)).scores > 0);
  await endProcess(killed, "SIGKILL");
  const before = await countScores(id);
  expect(before.scores).toBeLessThan(nodes.length);
  expect(await stateOf(id)).toBe("checking");

  await application.startWorker();
  await until("the submission is scored", async () => (await stateOf(id)) === "scored");
  expect(await countScores(id)).toEqual({ scores: nodes.length, scoredRuns: nodes.length });
  const written = await db
    .select({ norm: studies.norm, measure: studies.measure })
    .from(studies)
    .where(eq(studies.submissionId, id));
  expect(new Set(written.map(({ norm, measure }) => `${norm} ${measure}`)).size).toBe(written.length);
});
