import { formatError } from "./figures";

/** An error in the one format; `2.3e-6` is read out as it is written. */
export function Figure({ value, digits = 2 }: { value: number | null; digits?: number }) {
  return <span className="fig whitespace-nowrap">{value === null ? "—" : formatError(value, digits)}</span>;
}
