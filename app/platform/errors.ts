import type { Refusal } from "@/benchmarks/scoring/data-error";

/** What a use-case refuses with. One switch in app/http turns a kind into a status. */
export type AppErrorKind =
  | "notFound"
  | "unauthenticated"
  | "forbidden"
  | "conflict"
  | "invalid"
  | "tooLarge"
  | "limitReached";

export class AppError extends Error {
  constructor(
    readonly kind: AppErrorKind,
    message: string,
    readonly details: {
      /** A sentence for each field of the form, by its name. */
      fields?: Record<string, string>;
      refusals?: Refusal[];
      retryAfterSeconds?: number;
    } = {},
  ) {
    super(message);
    this.name = "AppError";
  }
}

export const notFound = (what: string) => new AppError("notFound", `${what} does not exist, or is not public.`);
export const unauthenticated = (message = "Sign in first.") => new AppError("unauthenticated", message);
export const forbidden = (message: string) => new AppError("forbidden", message);
export const conflict = (message: string) => new AppError("conflict", message);
export const invalid = (message: string, fields?: Record<string, string>) =>
  new AppError("invalid", message, { fields });
export const refusedData = (refusals: Refusal[]) =>
  new AppError("invalid", refusals.length === 1 ? "One file is refused." : `${refusals.length} files are refused.`, {
    refusals,
  });
export const tooLarge = (message: string) => new AppError("tooLarge", message);
export const limitReached = (message: string, retryAfterSeconds: number) =>
  new AppError("limitReached", message, { retryAfterSeconds });
