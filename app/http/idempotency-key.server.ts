import { invalid } from "@/app/platform/errors";

export function idempotencyKeyOf(request: Request): string | null {
  const key = request.headers.get("Idempotency-Key")?.trim() ?? null;
  if (key !== null && (key === "" || key.length > 200)) {
    throw invalid("An Idempotency-Key has 1 to 200 characters, such as a random UUID.");
  }
  return key;
}
