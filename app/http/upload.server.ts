import { randomUUID } from "node:crypto";
import type { Readable } from "node:stream";
import { logger } from "@/app/platform/logger.server";
import { putStream, remove } from "@/app/platform/storage.server";
import type { StoredFile } from "../features/submissions/stored-file";
import { readMultipart, type PartFromFields } from "./read-multipart.server";
import { createSlots } from "./slots.server";
import { uploadLimits, type UploadLimits } from "./upload-limits";

/** Bodies that are read at the same time in one process; more wait before their first byte is read. */
const storingSlots = createSlots(4);
const memorySlots = createSlots(2);

/** Streams the files of a multipart body to storage. When it throws, nothing of them is left there. */
export async function receiveUpload(
  request: Request,
  { limits = uploadLimits, fromFields }: { limits?: UploadLimits; fromFields?: PartFromFields } = {},
): Promise<{ submission: unknown; files: StoredFile[] }> {
  const storageKeys: string[] = [];
  const store = async (_name: string, stream: Readable) => {
    const storageKey = `files/${randomUUID()}`;
    storageKeys.push(storageKey);
    await putStream(storageKey, stream, { contentType: "application/octet-stream" });
    return storageKey;
  };
  return await storingSlots.use(request.signal, async () => {
    try {
      const { submission, files } = await readMultipart(request, limits, store, fromFields);
      return { submission, files: files.map(({ kept, ...file }) => ({ ...file, storageKey: kept })) };
    } catch (error) {
      await removeStored(storageKeys);
      throw error;
    }
  });
}

/** Reads a multipart body into memory and hands it on while its slot is held, so that memory stays bounded. */
export async function withFilesInMemory<R>(
  request: Request,
  use: (submission: unknown, files: { name: string; bytes: Uint8Array }[]) => Promise<R>,
  limits: UploadLimits = uploadLimits,
): Promise<R> {
  return await memorySlots.use(request.signal, async () => {
    const { submission, files } = await readMultipart(request, limits, (_name, stream) => collect(stream));
    return await use(
      submission,
      files.map(({ name, kept }) => ({ name, bytes: kept })),
    );
  });
}

async function collect(stream: Readable): Promise<Uint8Array> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream as AsyncIterable<Buffer>) chunks.push(chunk);
  return Buffer.concat(chunks);
}

/** The refusal that led here is what the caller reports, so a failing removal is only logged. */
async function removeStored(storageKeys: string[]): Promise<void> {
  const outcomes = await Promise.allSettled(storageKeys.map((key) => remove(key)));
  const failed = outcomes.filter((outcome) => outcome.status === "rejected");
  if (failed.length > 0) {
    logger.error("stored files could not be removed", { storageKeys, reason: String(failed[0].reason) });
  }
}
