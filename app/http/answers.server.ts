import { data, redirect } from "react-router";
import type { z } from "zod";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import { AppError } from "@/app/platform/errors";
import { readForm, valuesToShowAgain } from "./read-form.server";

/** The one switch from what a use-case refuses with to a status. */
export function statusOf(error: AppError): number {
  switch (error.kind) {
    case "unauthenticated":
      return 401;
    case "forbidden":
      return 403;
    case "notFound":
      return 404;
    case "conflict":
      return 409;
    case "tooLarge":
      return 413;
    case "invalid":
      return 422;
    case "limitReached":
      return 429;
  }
}

const titles: Record<number, string> = {
  400: "Bad request",
  401: "Sign-in needed",
  403: "Not allowed",
  404: "Not found",
  405: "Method not allowed",
  409: "Conflict",
  413: "Too large",
  415: "Media type not supported",
  422: "Refused",
  429: "Limit reached",
  500: "Error of the server",
  503: "Not available",
};

const slugs: Record<AppError["kind"], string> = {
  unauthenticated: "unauthenticated",
  forbidden: "forbidden",
  notFound: "not-found",
  conflict: "conflict",
  tooLarge: "too-large",
  invalid: "invalid",
  limitReached: "limit-reached",
};

/** RFC 9457. `type` is a name, not an address: it stays the same wherever the register is served. */
export interface Problem {
  type: string;
  title: string;
  status: number;
  detail: string;
  findings?: Refusal[];
}

/** An AppError as problem+json; anything else is thrown on, since an outage is not a refusal. */
export function problemJson(error: unknown): Response {
  if (!(error instanceof AppError)) throw error;
  const status = statusOf(error);
  const findings = error.details.refusals ?? fieldFindings(error);
  return problemResponse(
    {
      type: `urn:backsight:problem:${slugs[error.kind]}`,
      title: titleOf(status),
      status,
      detail: error.message,
      ...(findings.length > 0 ? { findings } : {}),
    },
    headersOf(error),
  );
}

/** A problem that no use-case raised: a method without an action, an outage. */
export function plainProblem(status: number, detail: string, headers?: HeadersInit): Response {
  return problemResponse({ type: "about:blank", title: titleOf(status), status, detail }, headers);
}

/** For every loader and action of the API: `return answerApi(() => ...)`. */
export async function answerApi(work: () => Promise<Response>): Promise<Response> {
  try {
    return await work();
  } catch (error) {
    return problemJson(error);
  }
}

/** What a page's ErrorBoundary finds in `error.data`, with `error.status` beside it. */
export interface PageProblem {
  title: string;
  detail: string;
  refusals: Refusal[];
  retryAfterSeconds: number | null;
}

/**
 * What a page throws for an AppError: `throw toResponse(error, request)`. A visitor who must sign in is sent to
 * the form and comes back. Anything that is not an AppError is thrown on as it is.
 */
export function toResponse(error: unknown, request?: Request) {
  if (!(error instanceof AppError)) throw error;
  if (error.kind === "unauthenticated" && request) return redirect(signInAddress(request));
  const status = statusOf(error);
  const problem: PageProblem = {
    title: titleOf(status),
    detail: error.message,
    refusals: error.details.refusals ?? [],
    retryAfterSeconds: error.details.retryAfterSeconds ?? null,
  };
  return data(problem, { status, headers: headersOf(error) });
}

/** For every page's loader: `return answerPage(request, () => ...)`. */
export async function answerPage<T>(request: Request, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    throw toResponse(error, request);
  }
}

/** A refused form, as its page shows it again. */
export interface FormRefusal {
  /** About the whole form; null where each sentence stands below its field. */
  message: string | null;
  fields: Record<string, string>;
  /** What was given, without passwords, so that a page without JavaScript can fill the form again. */
  values: Record<string, string>;
}

/**
 * For every action behind a form: reads it, does the work, and turns a refusal into fields and a status.
 *
 * @example return answerForm(request, joinForm, async (input) => { await joinAccount(input); return redirect("/"); })
 */
export async function answerForm<Schema extends z.ZodType, T>(
  request: Request,
  schema: Schema,
  work: (input: z.output<Schema>) => Promise<T>,
) {
  try {
    return await work(await readForm(request, schema));
  } catch (error) {
    if (!(error instanceof AppError) || !belongsToForm(error)) throw toResponse(error, request);
    const refusal: FormRefusal = {
      message: error.details.fields ? null : error.message,
      fields: error.details.fields ?? {},
      values: await valuesToShowAgain(request),
    };
    return data(refusal, { status: statusOf(error), headers: headersOf(error) });
  }
}

function belongsToForm(error: AppError): boolean {
  return error.kind === "invalid" || error.kind === "conflict" || error.kind === "limitReached";
}

export function titleOf(status: number): string {
  return titles[status] ?? "Refused";
}

function fieldFindings(error: AppError): Refusal[] {
  return Object.entries(error.details.fields ?? {}).map(([where, message]) => ({
    code: "field/invalid",
    message,
    file: null,
    where,
  }));
}

function headersOf(error: AppError): Record<string, string> {
  if (error.kind === "unauthenticated") return { "WWW-Authenticate": 'Bearer realm="backsight"' };
  const seconds = error.details.retryAfterSeconds;
  return seconds === undefined ? {} : { "Retry-After": String(seconds) };
}

function problemResponse(problem: Problem, headers?: HeadersInit): Response {
  const all = new Headers(headers);
  all.set("Content-Type", "application/problem+json");
  if (!all.has("Cache-Control")) all.set("Cache-Control", "no-store");
  return new Response(JSON.stringify(problem), { status: problem.status, headers: all });
}

function signInAddress(request: Request): string {
  const { pathname, search } = new URL(request.url);
  // An action's address need not have a page to come back to.
  if (request.method !== "GET") return "/sign-in";
  return `/sign-in?next=${encodeURIComponent(pathname + search)}`;
}
