import type { Refusal } from "@/benchmarks/scoring/data-error";

/** Pairs each run with the file it names; anything missing, unused or named twice is refused, all at once. */
export function matchFiles<F extends { name: string }>(
  runs: { file: string }[],
  files: F[],
): { matched: F[]; refusals: Refusal[] } {
  const byName = new Map(files.map((file) => [file.name, file]));
  const refusals: Refusal[] = [];
  const named = new Set<string>();
  const matched: F[] = [];
  for (const [index, run] of runs.entries()) {
    const file = byName.get(run.file);
    const where = `runs[${index}]`;
    if (named.has(run.file)) {
      refusals.push({
        code: "files/named-twice",
        message: `Two runs name the file ${run.file}. Give each run a file of its own.`,
        file: run.file,
        where,
      });
    } else if (!file) {
      refusals.push({
        code: "files/missing",
        message: `Run ${index + 1} of the list names ${run.file}, but no file of that name was sent.`,
        file: run.file,
        where,
      });
    } else {
      matched.push(file);
    }
    named.add(run.file);
  }
  for (const file of files) {
    if (named.has(file.name)) continue;
    refusals.push({
      code: "files/unused",
      message: `No run names the file ${file.name}. Add a run for it or leave the file out.`,
      file: file.name,
      where: null,
    });
  }
  return { matched, refusals };
}
