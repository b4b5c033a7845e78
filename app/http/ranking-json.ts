import type { NotReachedRow, RankedSubmission, Ranking, RankingRow } from "@/app/features/rankings/ranking";
import { normParameterOf } from "@/app/features/rankings/ranking-query";
import { toCsv, type CsvValue } from "./csv";

export function toRankingJson(ranking: Ranking) {
  return {
    problem: ranking.problem.slug,
    revision: ranking.revision,
    tolerance: ranking.tolerance,
    norm: normParameterOf[ranking.norm],
    measure: ranking.measure,
    by: ranking.by,
    rows: ranking.rows.map(toRowJson),
    notReached: ranking.notReached.map(toNotReachedJson),
    total: ranking.total,
    nextCursor: ranking.nextCursor,
  };
}

function toRankedJson(row: RankedSubmission) {
  return {
    submission: row.submissionId,
    record: row.record,
    solver: { ...row.solver, version: row.version },
    team: row.team,
    family: row.family,
    method: row.method,
    claim: row.claim,
    formalOrder: row.formalOrder,
    precision: row.precision,
    observed: row.observed,
    tail: row.tail,
  };
}

function toRowJson(row: RankingRow) {
  return {
    rank: row.rank,
    tied: row.isTied,
    position: row.position,
    ...toRankedJson(row),
    nodes: row.nodes,
    n: row.n,
    atMost: row.atMost,
    errorAtReading: row.errorAtReading,
    unknowns: row.unknowns,
    cost: row.cost,
  };
}

function toNotReachedJson(row: NotReachedRow) {
  return { ...toRankedJson(row), smallestError: row.smallestError, reason: row.reason, n: row.at };
}

type Line = RankingRow | NotReachedRow;

const rowOnly =
  (read: (row: RankingRow) => CsvValue) =>
  (line: Line): CsvValue =>
    "rank" in line ? read(line) : null;

const notReachedOnly =
  (read: (row: NotReachedRow) => CsvValue) =>
  (line: Line): CsvValue =>
    "rank" in line ? null : read(line);

/** The page's rows, then what does not reach the tolerance: those lines have no rank. */
export function toRankingCsv(ranking: Ranking): string {
  return toCsv<Line>(
    {
      rank: rowOnly((row) => row.rank),
      position: rowOnly((row) => row.position),
      submission: (line) => line.submissionId,
      record: (line) => `${line.record.number}/${line.record.version}`,
      team: (line) => line.team.slug,
      solver: (line) => line.solver.slug,
      version: (line) => line.version,
      family: (line) => line.family,
      formalOrder: (line) => line.formalOrder,
      observedKind: (line) => line.observed.kind,
      observedOrder: (line) => line.observed.order,
      observedRate: (line) => line.observed.rate,
      verdict: (line) => line.observed.verdict,
      precision: (line) => line.precision,
      nodes: rowOnly((row) => row.nodes),
      atMost: rowOnly((row) => row.atMost),
      errorAtReading: rowOnly((row) => row.errorAtReading),
      unknowns: rowOnly((row) => row.unknowns),
      cost: rowOnly((row) => row.cost),
      smallestError: notReachedOnly((row) => row.smallestError),
      reason: notReachedOnly((row) => row.reason),
    },
    [...ranking.rows, ...ranking.notReached],
  );
}
