import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { existsSync } from "node:fs";
import { createServer } from "node:net";
import { setTimeout as pause } from "node:timers/promises";
import { env } from "@/app/platform/env.server";

/** The built web process, and on demand workers, on the test's own database and the fakes of the test run. */
export interface Application {
  address: string;
  web: ChildProcess;
  startWorker(): Promise<ChildProcess>;
  /** The cookie of a new session. */
  signIn(email: string, password: string): Promise<string>;
  /** Ends what is still running. */
  stop(): Promise<void>;
}

const patienceMs = 60_000;

export async function startApplication(): Promise<Application> {
  const port = await freePort();
  const address = `http://127.0.0.1:${port}`;
  const settings = settingsFor(address, port);
  const web = startProcess("build/web.js", settings);
  const running = [web];
  await untilReady(address, web);
  return {
    address,
    web: web.child,
    startWorker: async () => {
      const worker = startProcess("build/worker.js", settings);
      running.push(worker);
      await worker.hasStarted;
      return worker.child;
    },
    signIn: (email, password) => signIn(address, email, password),
    stop: async () => {
      await Promise.all(running.map(({ child }) => endProcess(child, "SIGTERM")));
    },
  };
}

/** Waits for the end of a process that it signals. */
export async function endProcess(child: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const ended = once(child, "exit");
  child.kill(signal);
  await ended;
}

function settingsFor(address: string, port: number): NodeJS.ProcessEnv {
  const given = Object.fromEntries(Object.entries(env).map(([name, value]) => [name, String(value)]));
  return {
    ...process.env,
    ...given,
    NODE_ENV: "production",
    HOST: "127.0.0.1",
    PORT: String(port),
    PUBLIC_URL: address,
  };
}

function startProcess(file: string, settings: NodeJS.ProcessEnv) {
  if (!existsSync(file)) throw new Error(`${file} is missing: run npm run build before this test.`);
  const child = spawn(process.execPath, [file], { env: settings, stdio: ["ignore", "pipe", "pipe"] });
  let output = "";
  const keep = (chunk: Buffer) => {
    output = (output + chunk.toString("utf8")).slice(-20_000);
  };
  child.stdout.on("data", keep);
  child.stderr.on("data", keep);
  const hasStarted = new Promise<void>((resolve, reject) => {
    child.stdout.once("data", () => resolve());
    child.once("exit", (code, signal) =>
      reject(new Error(`${file} ended with ${code ?? signal}: ${output}`)),
    );
  });
  // The web process is waited for by its address instead.
  hasStarted.catch(() => undefined);
  return { child, hasStarted, output: () => output };
}

async function untilReady(address: string, web: ReturnType<typeof startProcess>): Promise<void> {
  const deadline = Date.now() + patienceMs;
  let last = "no answer";
  while (Date.now() < deadline) {
    if (web.child.exitCode !== null) throw new Error(`The web process ended: ${web.output()}`);
    last = await fetch(`${address}/api/v1/ready`).then(
      async (response) => (response.ok ? "ready" : await response.text()),
      (error: unknown) => String(error),
    );
    if (last === "ready") return;
    await pause(200);
  }
  throw new Error(`The web process is not ready after ${patienceMs / 1000} s (${last}): ${web.output()}`);
}

async function signIn(address: string, email: string, password: string): Promise<string> {
  const response = await fetch(`${address}/sign-in`, {
    method: "POST",
    redirect: "manual",
    body: new URLSearchParams({ email, password }),
  });
  const cookie = response.headers.get("Set-Cookie")?.split(";")[0];
  if (response.status !== 302 || !cookie)
    throw new Error(`Signing in as ${email} answered ${response.status}.`);
  return cookie;
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, "127.0.0.1");
  await once(server, "listening");
  const address = server.address();
  server.close();
  await once(server, "close");
  if (address === null || typeof address === "string") throw new Error("The system gave no port.");
  return address.port;
}
