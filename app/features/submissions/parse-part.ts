import type { z } from "zod";
import { AppError } from "@/app/platform/errors";

/** Reads a `submission` part; every wrong place is named as the JSON path that leads to it. */
export function parsePart<T extends z.ZodType>(schema: T, part: unknown): z.output<T> {
  const parsed = schema.safeParse(part);
  if (parsed.success) return parsed.data;
  const fields = Object.fromEntries(
    parsed.error.issues.map((issue) => [pathOf(issue.path) || "submission", issue.message]),
  );
  const sentences = Object.entries(fields).map(([path, message]) => `${path}: ${message}`);
  throw new AppError("invalid", `The submission part cannot be read. ${sentences.join(" ")}`, { fields });
}

/** `runs[2].n`, the way a reader of the JSON would write it. */
function pathOf(path: PropertyKey[]): string {
  return path
    .map((key) => (typeof key === "number" ? `[${key}]` : `.${String(key)}`))
    .join("")
    .replace(/^\./, "");
}
