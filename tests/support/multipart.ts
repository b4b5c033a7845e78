export interface MultipartPart {
  name: string;
  content: string | Uint8Array;
  filename?: string;
  type?: string;
}

export const boundary = "backsight-test-boundary";

/** The bytes of a multipart body, as a client would write them. */
export function multipartBytes(parts: MultipartPart[], { isTruncated = false } = {}): Uint8Array {
  const chunks: Uint8Array[] = [];
  const text = (value: string) => chunks.push(Buffer.from(value, "utf8"));
  for (const part of parts) {
    const filename = part.filename === undefined ? "" : `; filename="${part.filename}"`;
    text(`--${boundary}\r\nContent-Disposition: form-data; name="${part.name}"${filename}\r\n`);
    text(`Content-Type: ${part.type ?? "application/octet-stream"}\r\n\r\n`);
    chunks.push(typeof part.content === "string" ? Buffer.from(part.content, "utf8") : part.content);
    text("\r\n");
  }
  if (!isTruncated) text(`--${boundary}--\r\n`);
  return Buffer.concat(chunks);
}

export interface MultipartRequestOptions {
  address?: string;
  headers?: Record<string, string>;
  chunkBytes?: number;
  /** Break the connection after the last byte instead of ending the body. */
  breaksOff?: boolean;
  isTruncated?: boolean;
}

/** A POST whose body arrives in chunks, the way a network delivers it. */
export function multipartRequest(parts: MultipartPart[], options: MultipartRequestOptions = {}): Request {
  const bytes = multipartBytes(parts, { isTruncated: options.isTruncated });
  const chunkBytes = options.chunkBytes ?? 65_536;
  let offset = 0;
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      if (offset < bytes.length) {
        controller.enqueue(bytes.slice(offset, offset + chunkBytes));
        offset += chunkBytes;
      } else if (options.breaksOff) {
        controller.error(new Error("socket hang up"));
      } else {
        controller.close();
      }
    },
  });
  return new Request(options.address ?? "http://127.0.0.1/api/v1/submissions", {
    method: "POST",
    headers: { "Content-Type": `multipart/form-data; boundary=${boundary}`, ...options.headers },
    body,
    duplex: "half",
  } as RequestInit & { duplex: "half" });
}

/** The `submission` part and files in their usual order. */
export function submissionParts(submission: unknown, files: Record<string, Uint8Array>): MultipartPart[] {
  return [
    { name: "submission", content: JSON.stringify(submission), type: "application/json" },
    ...Object.entries(files).map(([filename, content]) => ({ name: "files", filename, content })),
  ];
}
