import { describe, expect, it } from "vitest";
import { z } from "zod";
import { answerApi, answerForm, answerPage, problemJson } from "@/app/http/answers.server";
import {
  type AppErrorKind,
  AppError,
  conflict,
  invalid,
  limitReached,
  notFound,
  refusedData,
  unauthenticated,
} from "@/app/platform/errors";

const statuses: Record<AppErrorKind, number> = {
  unauthenticated: 401,
  forbidden: 403,
  notFound: 404,
  conflict: 409,
  tooLarge: 413,
  invalid: 422,
  limitReached: 429,
};

describe("an error of the API", () => {
  it.each(Object.entries(statuses) as [AppErrorKind, number][])(
    "of the kind %s is problem+json with status %i",
    async (kind, status) => {
      const response = problemJson(new AppError(kind, "What was found and what to do."));
      expect(response.status).toBe(status);
      expect(response.headers.get("Content-Type")).toBe("application/problem+json");
      const body = (await response.json()) as Record<string, unknown>;
      expect(body).toMatchObject({ status, detail: "What was found and what to do." });
      expect(body.type).toMatch(/^urn:backsight:problem:[a-z-]+$/);
      expect(body.title).not.toBe("");
      expect(body).not.toHaveProperty("findings");
    },
  );

  it("lists refused files as findings", async () => {
    const refusal = { code: "format/bad-magic", message: "Not NPY.", file: "n32.npy", where: "byte 0" };
    const body = (await problemJson(refusedData([refusal])).json()) as Record<string, unknown>;
    expect(body.findings).toEqual([refusal]);
  });

  it("lists refused fields as findings of the same shape", async () => {
    const body = (await problemJson(invalid("No.", { tolerance: "Give a number." })).json()) as Record<
      string,
      unknown
    >;
    expect(body.findings).toEqual([
      { code: "field/invalid", message: "Give a number.", file: null, where: "tolerance" },
    ]);
  });

  it("says when to try again where a limit is reached", () => {
    expect(problemJson(limitReached("Too many.", 17)).headers.get("Retry-After")).toBe("17");
  });

  it("names the way to sign in where a token is missing", () => {
    expect(problemJson(unauthenticated()).headers.get("WWW-Authenticate")).toContain("Bearer");
  });

  it("never makes a refusal of an outage", async () => {
    const outage = new Error("connection refused");
    await expect(answerApi(() => Promise.reject(outage))).rejects.toBe(outage);
    await expect(answerPage(get("/records"), () => Promise.reject(outage))).rejects.toBe(outage);
    await expect(answerForm(post({ name: "a" }), form, () => Promise.reject(outage))).rejects.toBe(outage);
  });
});

describe("an error of a page", () => {
  it("reaches the page's error boundary with its status and sentence", async () => {
    await expect(
      answerPage(get("/records/9/1"), () => Promise.reject(notFound("Record 9"))),
    ).rejects.toMatchObject({
      init: { status: 404 },
      data: { title: "Not found", detail: "Record 9 does not exist, or is not public." },
    });
  });

  it("sends a visitor who must sign in to the form, with the way back", async () => {
    const thrown: unknown = await answerPage(get("/submit?problem=a"), () =>
      Promise.reject(unauthenticated()),
    ).catch((error: unknown) => error);
    expect(thrown).toBeInstanceOf(Response);
    expect((thrown as Response).headers.get("Location")).toBe("/sign-in?next=%2Fsubmit%3Fproblem%3Da");
  });
});

const form = z.object({ name: z.string().min(1, "Give a name."), password: z.string().optional() });

describe("a form", () => {
  it("is handed on once all its fields are right", async () => {
    expect(await answerForm(post({ name: "Ada" }), form, async (input) => input.name)).toBe("Ada");
  });

  it("comes back with a sentence for each wrong field and the given texts, never a password", async () => {
    const answer = await answerForm(
      post({ name: "", team: "t", password: "secret words" }),
      form,
      async () => null,
    );
    expect(answer).toMatchObject({
      init: { status: 422 },
      data: { message: null, fields: { name: "Give a name." }, values: { name: "", team: "t" } },
    });
    expect(JSON.stringify(answer)).not.toContain("secret words");
  });

  it("comes back with the use-case's sentence where no field is to blame", async () => {
    const answer = await answerForm(post({ name: "Ada" }), form, () => Promise.reject(conflict("Taken.")));
    expect(answer).toMatchObject({ init: { status: 409 }, data: { message: "Taken.", fields: {} } });
  });

  it("comes back with Retry-After where a limit is reached", async () => {
    const answer = await answerForm(post({ name: "Ada" }), form, () =>
      Promise.reject(limitReached("Wait.", 60)),
    );
    expect(answer).toMatchObject({ init: { status: 429, headers: { "Retry-After": "60" } } });
  });

  it("is refused where its body is longer than any form of the site", async () => {
    const thrown: unknown = await answerForm(
      post({ name: "x".repeat(70_000) }),
      form,
      async () => null,
    ).catch((error: unknown) => error);
    expect(thrown).toMatchObject({ init: { status: 413 } });
  });

  it("reads a field that comes twice as a list", async () => {
    const body = new URLSearchParams([
      ["scopes", "read"],
      ["scopes", "submit"],
    ]);
    const request = new Request("http://here.example/", { method: "POST", body });
    const lists = z.object({ scopes: z.array(z.string()) });
    expect(await answerForm(request, lists, async (input) => input.scopes)).toEqual(["read", "submit"]);
  });
});

function get(path: string): Request {
  return new Request(`http://here.example${path}`);
}

function post(fields: Record<string, string>): Request {
  return new Request("http://here.example/form", { method: "POST", body: new URLSearchParams(fields) });
}
