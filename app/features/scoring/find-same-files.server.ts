import { and, asc, eq, inArray, ne } from "drizzle-orm";
import { db } from "@/app/platform/db.server";
import type { Finding } from "@/benchmarks/scoring/result";
import { files, runs, submissions } from "@/drizzle/schema";
import { sameFileCode } from "./same-file-code";
import type { StoredStudy } from "./stored-study.server";

/** One finding for each run whose bytes belong to another submission too. */
export async function findSameFiles(study: StoredStudy): Promise<Finding[]> {
  const checksums = study.runs.map((run) => run.sha256);
  const rows = await db
    .selectDistinct({
      sha256: files.sha256,
      submissionId: submissions.id,
      number: submissions.number,
      n: runs.n,
    })
    .from(files)
    .innerJoin(runs, eq(runs.fileId, files.id))
    .innerJoin(submissions, eq(submissions.id, runs.submissionId))
    .where(and(inArray(files.sha256, checksums), ne(submissions.id, study.submissionId)))
    .orderBy(asc(submissions.number));
  return rows.flatMap((row) =>
    study.runs
      .filter((run) => run.sha256 === row.sha256)
      .map((run) => ({
        code: sameFileCode,
        severity: "warning" as const,
        message: `The file ${run.declaration.file} is byte for byte the same as one of submission S-${row.number}.`,
        run: run.declaration.n,
        figures: { submission: row.submissionId, sha256: row.sha256 },
      })),
  );
}
