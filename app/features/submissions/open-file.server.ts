import { eq } from "drizzle-orm";
import type { Readable } from "node:stream";
import { z } from "zod";
import { db } from "@/app/platform/db.server";
import { notFound } from "@/app/platform/errors";
import { getStream } from "@/app/platform/storage.server";
import { files, runs, submissions } from "@/drizzle/schema";
import type { Viewer } from "../accounts/viewer";
import { canDownload } from "./submission-policy";

export interface FileFacts {
  submissionId: string;
  name: string;
  /** Of the whole file. */
  sizeBytes: number;
  sha256: string;
  dataLicence: string;
  /** Anyone may read it, so shared caches may keep it. */
  isPublic: boolean;
}

/** Inclusive byte positions. */
export interface ByteRange {
  start: number;
  end: number;
}

/** What is known of a run's file, before a byte of it is read. */
export async function describeFile(
  viewer: Viewer,
  runId: string,
): Promise<FileFacts & { storageKey: string }> {
  const [row] = z.uuid().safeParse(runId).success
    ? await db
        .select({
          submissionId: submissions.id,
          state: submissions.state,
          teamId: submissions.teamId,
          dataLicence: submissions.dataLicence,
          file: files,
        })
        .from(runs)
        .innerJoin(files, eq(files.id, runs.fileId))
        .innerJoin(submissions, eq(submissions.id, runs.submissionId))
        .where(eq(runs.id, runId))
    : [];
  if (!row || !canDownload(viewer, row)) throw notFound("The file");
  const { name, sizeBytes, sha256, storageKey } = row.file;
  return {
    submissionId: row.submissionId,
    name,
    sizeBytes,
    sha256,
    dataLicence: row.dataLicence,
    isPublic: canDownload(null, row),
    storageKey,
  };
}

/** The stored bytes of a run's file, whole or a range of them. */
export async function openFile(
  viewer: Viewer,
  runId: string,
  range: ByteRange | null = null,
): Promise<FileFacts & { body: Readable }> {
  const { storageKey, ...facts } = await describeFile(viewer, runId);
  const { body } = await getStream(storageKey, range ?? undefined);
  return { ...facts, body };
}
