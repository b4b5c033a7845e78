import { invalid } from "@/app/platform/errors";
import type { SortKey } from "./rank-studies";

/** A cursor holds the key of the last row that was given, so that a page stays right while records come and go. */
export function encodeCursor(key: SortKey): string {
  return Buffer.from(JSON.stringify(key)).toString("base64url");
}

export function decodeCursor(cursor: string): SortKey {
  const key = parseJson(Buffer.from(cursor, "base64url").toString("utf8"));
  const isKey =
    Array.isArray(key) &&
    key.length === 4 &&
    key.slice(0, 3).every((part) => typeof part === "number") &&
    typeof key[3] === "string";
  if (!isKey) {
    throw invalid("The cursor is not one of this ranking.", { cursor: "Use nextCursor of the page before." });
  }
  return key as SortKey;
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
