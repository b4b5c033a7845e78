import { Readable } from "node:stream";
import type { Viewer } from "@/app/features/accounts/viewer";
import { describeFile, openFile, type FileFacts } from "@/app/features/submissions/open-file.server";
import { notFound } from "@/app/platform/errors";
import { plainProblem } from "./answers.server";
import { parseRange } from "./byte-range";
import { matchesEtag } from "./public-read.server";

interface FileRequest {
  request: Request;
  viewer: Viewer;
  runId: string;
  /** The submission that the address names, where it names one. */
  submissionId?: string;
}

/** A stored file as a download: it never changes, so it may be kept for good; ranges are honoured. */
export async function answerFile({ request, viewer, runId, submissionId }: FileRequest): Promise<Response> {
  const file = await describeFile(viewer, runId);
  if (submissionId !== undefined && submissionId !== file.submissionId) throw notFound("The file");
  const headers = headersOf(file);
  const etag = headers.get("ETag") ?? "";
  if (matchesEtag(request.headers.get("If-None-Match"), etag))
    return new Response(null, { status: 304, headers });

  const range = isRangeWanted(request, etag)
    ? parseRange(request.headers.get("Range"), file.sizeBytes)
    : null;
  if (range === "unsatisfiable") {
    return plainProblem(416, `The file ends at byte ${file.sizeBytes}.`, {
      "Content-Range": `bytes */${file.sizeBytes}`,
    });
  }
  const length = range === null ? file.sizeBytes : range.end - range.start + 1;
  headers.set("Content-Length", String(length));
  if (range !== null) headers.set("Content-Range", `bytes ${range.start}-${range.end}/${file.sizeBytes}`);
  const status = range === null ? 200 : 206;
  if (request.method === "HEAD") return new Response(null, { status, headers });

  const { body } = await openFile(viewer, runId, range);
  request.signal.addEventListener("abort", () => body.destroy(), { once: true });
  return new Response(Readable.toWeb(body) as ReadableStream<Uint8Array>, { status, headers });
}

/** If-Range: a range of another state of the file would not fit to what the client has. */
function isRangeWanted(request: Request, etag: string): boolean {
  const ifRange = request.headers.get("If-Range");
  return ifRange === null || ifRange === etag;
}

function headersOf(file: FileFacts): Headers {
  const plainName = file.name.replace(/[^\w. -]/g, "_");
  const encodedName = encodeURIComponent(file.name).replace(
    /['()*]/g,
    (character) => `%${character.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return new Headers({
    "Content-Type": "application/octet-stream",
    "Content-Disposition": `attachment; filename="${plainName}"; filename*=UTF-8''${encodedName}`,
    "X-Content-Type-Options": "nosniff",
    "Content-Security-Policy": "sandbox; default-src 'none'",
    "Cache-Control": `${file.isPublic ? "public" : "private"}, max-age=31536000, immutable`,
    "Accept-Ranges": "bytes",
    ETag: `"${file.sha256}"`,
    "Repr-Digest": `sha-256=:${Buffer.from(file.sha256, "hex").toString("base64")}:`,
    "X-Data-Licence": file.dataLicence,
  });
}
