import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { createApiKey } from "@/app/features/api-keys/create-api-key.server";
import { grantableScopes } from "@/app/features/api-keys/api-key-policy";
import type { Account } from "@/app/features/accounts/viewer";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { scoreStoredSubmission } from "@/app/features/scoring/score-submission.server";
import { getSubmission } from "@/app/features/submissions/get-submission.server";
import type { ApiScope } from "@/drizzle/enums";
import { startApplication, type Application } from "../support/application";
import { useDatabase } from "../support/database";
import { advectionStudy, makeAccount, submit, submitAndList, submitForReview } from "../support/register";
import { listRouteCalls } from "../support/route-calls";
import { matrix, viewers, type ViewerName } from "./role-matrix";

useDatabase();

let application: Application;
let addresses: Record<string, string> = {};
const headers = new Map<ViewerName, { page: HeadersInit; call: HeadersInit }>();

/** A session for pages and reads; a token with all scopes of the role for the API's writes. */
async function credentialsOf(account: Account): Promise<{ page: HeadersInit; call: HeadersInit }> {
  const cookie = await application.signIn(account.email, "a long password");
  return { page: { Cookie: cookie }, call: await tokenOf(account, grantableScopes(account)) };
}

async function tokenOf(account: Account, scopes: ApiScope[]): Promise<HeadersInit> {
  const { secret } = await createApiKey(account, { name: scopes.join(), scopes, expiresInDays: 30 });
  return { Authorization: `Bearer ${secret}` };
}

beforeAll(async () => {
  await publishShippedProblems();
  application = await startApplication();
  const author = await makeAccount("author", "Matrix Group");
  const other = await makeAccount("author", "Other Group");
  const maintainer = await makeAccount("maintainer");
  const admin = await makeAccount("admin");
  const study = (solver: string) => advectionStudy({ team: "matrix-group", solver });

  const scored = await submit(author, study("scored"));
  await scoreStoredSubmission(scored.id);
  const inReview = await submitForReview(author, study("in-review"));
  const listed = await submitAndList(author, admin, study("listed"));
  const { runs } = await getSubmission(author, scored.id);
  const { runs: listedRuns } = await getSubmission(author, listed.id);
  addresses = {
    scored: scored.id,
    inReview,
    listed: listed.id,
    record: `${listed.record.number}/${listed.record.version}`,
    scoredRun: runs[0].id,
    listedRun: listedRuns[0].id,
  };

  headers.set("visitor", { page: {}, call: {} });
  for (const [name, account] of Object.entries({ author, other, maintainer, admin }) as [
    ViewerName,
    Account,
  ][]) {
    headers.set(name, await credentialsOf(account));
  }
  const tokens = { read: author, submit: author, curate: maintainer, review: admin };
  for (const [scope, account] of Object.entries(tokens) as [ApiScope, Account][]) {
    const token = await tokenOf(account, [scope]);
    headers.set(scope, { page: token, call: token });
  }
});

afterAll(async () => {
  await application.stop();
});

async function statusOf(viewer: ViewerName, method: "GET" | "POST", pattern: string): Promise<number> {
  const path = pattern.replace(/\{(\w+)\}/g, (_, name: string) => addresses[name] ?? name);
  const isCall = path.startsWith("/api/") && method === "POST";
  const response = await fetch(application.address + path, {
    method,
    redirect: "manual",
    headers: { ...headers.get(viewer)?.[isCall ? "call" : "page"], ...(isCall ? jsonType : {}) },
    body: method === "GET" ? null : isCall ? "{}" : new URLSearchParams(),
    signal: AbortSignal.timeout(30_000),
  });
  await response.body?.cancel();
  return response.status;
}

const jsonType = { "Content-Type": "application/json" };

describe("who may call what", () => {
  it("is written down for every loader and action of the routes, and for no other", async () => {
    expect([...new Set(matrix.map((row) => row.call))].sort()).toEqual(await listRouteCalls());
  });

  it.each(matrix.map((row) => [`${row.call}, ${row.path}`, row] as const))("%s", async (_title, row) => {
    const { method, path, expected } = row;
    const found: string[] = [];
    for (const viewer of viewers) found.push(`${viewer} ${await statusOf(viewer, method, path)}`);
    expect(found).toEqual(viewers.map((viewer) => `${viewer} ${expected[viewer]}`));
  });
});
