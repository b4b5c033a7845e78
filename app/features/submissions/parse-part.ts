import type { z } from "zod";
import { AppError } from "@/app/platform/errors";

/** Reads a `submission` part; every wrong place is named as the JSON path that leads to it. */
export function parsePart<T extends z.ZodType>(schema: T, part: unknown): z.output<T> {
  const parsed = schema.safeParse(part, { reportInput: true });
  if (parsed.success) return parsed.data;
  const fields = Object.fromEntries(
    parsed.error.issues.map((issue) => [pathOf(issue.path) || "submission", sentenceOf(issue)]),
  );
  const sentences = Object.entries(fields).map(([path, sentence]) => `${path}: ${sentence}`);
  throw new AppError("invalid", `The submission part cannot be used. ${sentences.join(" ")}`, { fields });
}

/** `runs[2].n`, the way a reader of the JSON would write it. */
function pathOf(path: PropertyKey[]): string {
  return path
    .map((key) => (typeof key === "number" ? `[${key}]` : `.${String(key)}`))
    .join("")
    .replace(/^\./, "");
}

/** What was found, what was expected and what to do; our own messages of the schemas stand as they are. */
function sentenceOf(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined
        ? `This field is missing. Give ${spoken(issue.expected)}.`
        : `Found ${found(issue.input)}, expected ${spoken(issue.expected)}.`;
    case "invalid_value":
      return `Found ${found(issue.input)}. Use one of ${issue.values.map(String).join(", ")}.`;
    case "unrecognized_keys":
      return `The field ${issue.keys.join(", ")} is not known here. Check its spelling or leave it out.`;
    case "invalid_union":
      return `Found ${found(issue.input)}, which is none of the forms that this field takes.`;
    case "too_small":
      return `Found ${found(issue.input)}. Give ${issue.inclusive ? "" : "more than "}${issue.minimum}${issue.inclusive ? " or more" : ""}${unitOf(issue.origin)}.`;
    case "too_big":
      return `Found ${found(issue.input)}. Give ${issue.inclusive ? "at most" : "less than"} ${issue.maximum}${unitOf(issue.origin)}.`;
    default:
      return issue.message;
  }
}

function spoken(expected: string): string {
  if (expected === "int") return "a whole number";
  return `${/^[aeiou]/.test(expected) ? "an" : "a"} ${expected}`;
}

function unitOf(origin: string): string {
  if (origin === "string") return " characters";
  return origin === "array" ? " entries" : "";
}

function found(input: unknown): string {
  if (input === undefined) return "nothing";
  const text = JSON.stringify(input) ?? typeof input;
  return text.length > 60 ? `${text.slice(0, 57)}...` : text;
}
