import type { RouteConfigEntry } from "@react-router/dev/routes";
import routes from "@/app/routes";

/** Every loader and action that the routes have, as "routes/home.tsx loader". */
export async function listRouteCalls(): Promise<string[]> {
  const files = [...new Set(filesOf(await routes))];
  const calls = await Promise.all(
    files.map(async (file) => {
      const module = (await import(`../../app/${file}`)) as Record<string, unknown>;
      return ["loader", "action"]
        .filter((name) => typeof module[name] === "function")
        .map((name) => `${file} ${name}`);
    }),
  );
  return calls.flat().sort();
}

function filesOf(entries: RouteConfigEntry[]): string[] {
  return entries.flatMap((entry) => [entry.file, ...filesOf(entry.children ?? [])]);
}
