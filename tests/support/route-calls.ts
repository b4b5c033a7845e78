import type { RouteConfigEntry } from "@react-router/dev/routes";
import routes from "@/app/routes";

const modules = import.meta.glob<Record<string, unknown>>("../../app/routes/**/*.{ts,tsx}");

/** Every loader and action that the routes have, as "routes/home.tsx loader". */
export async function listRouteCalls(): Promise<string[]> {
  const files = [...new Set(filesOf(await routes))];
  const calls = await Promise.all(files.map(callsOf));
  return calls.flat().sort();
}

async function callsOf(file: string): Promise<string[]> {
  const load = modules[`../../app/${file}`];
  if (!load) throw new Error(`The routes name ${file}, which does not exist.`);
  const module = await load();
  return ["loader", "action"]
    .filter((name) => typeof module[name] === "function")
    .map((name) => `${file} ${name}`);
}

function filesOf(entries: RouteConfigEntry[]): string[] {
  return entries.flatMap((entry) => [entry.file, ...filesOf(entry.children ?? [])]);
}
