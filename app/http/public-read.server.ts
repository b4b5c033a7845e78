import { createHash } from "node:crypto";

/** Anyone may keep it, and asks before using it again: a record that was just listed shows at once. */
const publicCaching = "public, max-age=0, must-revalidate";

export interface ReadAnswer {
  /** The rows of the same answer as a table, where the resource has one. */
  csv?: () => string;
  /** For what depends on the viewer: kept by nobody else. */
  isPrivate?: boolean;
}

/** A read of the API: JSON, or CSV where it is asked for, with an ETag and an empty answer where nothing changed. */
export function answerRead(
  request: Request,
  value: unknown,
  { csv, isPrivate = false }: ReadAnswer = {},
): Response {
  const isCsv = csv !== undefined && wantsCsv(request);
  const body = isCsv ? csv() : JSON.stringify(value);
  const etag = `"${createHash("sha256").update(body).digest("base64url").slice(0, 27)}"`;
  const headers = new Headers({
    "Content-Type": isCsv ? "text/csv; charset=utf-8" : "application/json",
    "Cache-Control": isPrivate ? "private, no-cache" : publicCaching,
    ETag: etag,
    Vary: isPrivate ? "Accept, Authorization, Cookie" : "Accept",
  });
  if (matchesEtag(request.headers.get("If-None-Match"), etag))
    return new Response(null, { status: 304, headers });
  return new Response(body, { headers });
}

function wantsCsv(request: Request): boolean {
  const format = new URL(request.url).searchParams.get("format");
  if (format !== null) return format === "csv";
  const accept = request.headers.get("Accept") ?? "";
  return /\btext\/csv\b/.test(accept) && !/\bapplication\/json\b/.test(accept);
}

export function matchesEtag(ifNoneMatch: string | null, etag: string): boolean {
  if (ifNoneMatch === null) return false;
  // A compressing layer between may have weakened the tag.
  return ifNoneMatch.split(",").some((tag) => ["*", etag].includes(tag.trim().replace(/^W\//, "")));
}
