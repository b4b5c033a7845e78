import { DataError } from "@/benchmarks/scoring/data-error";

/** What the action refuses with. Fails where it succeeds or throws anything but a DataError. */
export function refusalOf(action: () => unknown): DataError {
  try {
    action();
  } catch (error) {
    if (error instanceof DataError) return error;
    throw error;
  }
  throw new Error("Expected a refusal, and there was none");
}
