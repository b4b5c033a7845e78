/** Inclusive positions, as HTTP counts them. */
export interface RequestedRange {
  start: number;
  end: number;
}

/**
 * RFC 9110, section 14: one range of bytes of a body of `sizeBytes`. Null where the whole is to be sent (no range, several,
 * another unit, a malformed one); "unsatisfiable" where it lies beyond the end.
 */
export function parseRange(
  header: string | null,
  sizeBytes: number,
): RequestedRange | "unsatisfiable" | null {
  const match = /^bytes=(\d*)-(\d*)$/i.exec(header?.replaceAll(" ", "") ?? "");
  if (!match || (match[1] === "" && match[2] === "")) return null;
  if (match[1] === "") {
    const length = Math.min(Number(match[2]), sizeBytes);
    return length === 0 ? "unsatisfiable" : { start: sizeBytes - length, end: sizeBytes - 1 };
  }
  const start = Number(match[1]);
  const end = match[2] === "" ? sizeBytes - 1 : Math.min(Number(match[2]), sizeBytes - 1);
  if (match[2] !== "" && Number(match[2]) < start) return null;
  return start >= sizeBytes ? "unsatisfiable" : { start, end };
}
