import { readFileSync } from "node:fs";
import { connect } from "node:net";
import { count } from "drizzle-orm";
import { afterEach, beforeAll, beforeEach, expect, it } from "vitest";
import { createApiKey } from "@/app/features/api-keys/create-api-key.server";
import { publishShippedProblems } from "@/app/features/problems/publish-shipped-problems.server";
import { db } from "@/app/platform/db.server";
import { files, runs, submissions } from "@/drizzle/schema";
import { endProcess, startApplication, type Application } from "../support/application";
import { useDatabase } from "../support/database";
import { boundary, multipartBytes, submissionParts } from "../support/multipart";
import { advectionStudy, makeAccount } from "../support/register";
import { storedKeys } from "../support/storage";
import { until } from "../support/until";

useDatabase();

const mebibyte = 2 ** 20;
let application: Application;
let token: string;

beforeAll(async () => {
  await publishShippedProblems();
  const author = await makeAccount("author", "Upload Group");
  token = (await createApiKey(author, { name: "upload", scopes: ["submit"], expiresInDays: 30 })).secret;
});

beforeEach(async () => {
  application = await startApplication();
});

afterEach(async () => {
  await application.stop();
});

const headers = () => ({
  Authorization: `Bearer ${token}`,
  "Content-Type": `multipart/form-data; boundary=${boundary}`,
});

async function post(bytes: Uint8Array): Promise<Response> {
  return await fetch(`${application.address}/api/v1/submissions`, {
    method: "POST",
    headers: headers(),
    body: new Uint8Array(bytes),
  });
}

/** The most memory that the process has ever had resident, from the kernel's own account. */
function peakBytes(pid: number | undefined): number {
  const match = /VmHWM:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, "utf8"));
  if (!match) throw new Error(`The kernel gives no peak memory of process ${pid}.`);
  return 1024 * Number(match[1]);
}

const rowCounts = async () => {
  const tables = [submissions, runs, files];
  const counted = await Promise.all(tables.map((table) => db.select({ rows: count() }).from(table)));
  return counted.map(([{ rows }]) => rows);
};

it("an upload of 60 MB makes the web process's peak memory grow by less than 150 MB", async () => {
  const small = advectionStudy({ team: "upload-group", solver: "small" });
  expect((await post(multipartBytes(submissionParts(small.part, small.files)))).status).toBe(201);
  const before = peakBytes(application.web.pid);

  const large = advectionStudy({ team: "upload-group", solver: "large", nodes: [64] });
  const [name] = Object.keys(large.files);
  const content = Buffer.alloc(60_000_000, "backsight");
  const response = await post(multipartBytes(submissionParts(large.part, { [name]: content })));
  expect(response.status).toBe(201);
  const grown = peakBytes(application.web.pid) - before;
  console.info(`peak memory grew by ${(grown / 1e6).toFixed(1)} MB`);
  expect(grown).toBeLessThan(150e6);
});

it("a web process killed in the middle of an upload leaves no row and nothing listed in storage", async () => {
  const rowsBefore = await rowCounts();
  const keysBefore = await storedKeys();
  const study = advectionStudy({ team: "upload-group", solver: "killed", nodes: [64] });
  const [name] = Object.keys(study.files);
  const whole = multipartBytes(submissionParts(study.part, { [name]: Buffer.alloc(40 * mebibyte, 7) }));

  const socket = connect(Number(new URL(application.address).port), "127.0.0.1");
  // The server's end breaks off the connection; that is what is tested.
  socket.on("error", () => undefined);
  const head = Object.entries({ Host: "127.0.0.1", ...headers(), "Content-Length": String(whole.length) })
    .map(([field, value]) => `${field}: ${value}\r\n`)
    .join("");
  socket.write(`POST /api/v1/submissions HTTP/1.1\r\n${head}\r\n`);
  socket.write(whole.subarray(0, 24 * mebibyte));
  await until("half of the body has gone out", async () => Promise.resolve(socket.writableLength === 0));
  await endProcess(application.web, "SIGKILL");
  socket.destroy();

  expect(await rowCounts()).toEqual(rowsBefore);
  expect(await storedKeys()).toEqual(keysBefore);

  // The same upload goes through afterwards: nothing of the broken one is in its way.
  await application.stop();
  application = await startApplication();
  expect((await post(whole)).status).toBe(201);
});
