import { describe, expect, it } from "vitest";
import { parseRange } from "@/app/http/byte-range";
import { toCsv } from "@/app/http/csv";
import { answerRead } from "@/app/http/public-read.server";

const request = (headers: Record<string, string> = {}, address = "http://127.0.0.1/api/v1/problems") =>
  new Request(address, { headers });

describe("a public read", () => {
  it("answers 304 without a body to the ETag it gave, also a weakened one", async () => {
    const first = answerRead(request(), { a: 1 });
    const etag = first.headers.get("ETag") ?? "";
    expect(await first.json()).toEqual({ a: 1 });
    for (const tag of [etag, `W/${etag}`, `"other", ${etag}`]) {
      const again = answerRead(request({ "If-None-Match": tag }), { a: 1 });
      expect([again.status, await again.text()]).toEqual([304, ""]);
    }
    expect(answerRead(request({ "If-None-Match": etag }), { a: 2 }).status).toBe(200);
  });

  it("answers CSV where Accept or ?format asks for it, JSON otherwise", () => {
    const typeOf = (...given: Parameters<typeof request>) =>
      answerRead(request(...given), {}, { csv: () => "a\r\n" }).headers.get("Content-Type");
    expect(typeOf({ Accept: "text/csv" })).toMatch("text/csv");
    expect(typeOf({}, "http://127.0.0.1/?format=csv")).toMatch("text/csv");
    expect(typeOf({ Accept: "*/*" })).toBe("application/json");
    expect(typeOf({ Accept: "text/csv" }, "http://127.0.0.1/?format=json")).toBe("application/json");
  });
});

describe("a table as CSV", () => {
  it("quotes what RFC 4180 asks to quote and leaves null empty", () => {
    const columns = {
      name: (row: { v: string | null }) => row.v,
      length: (row: { v: string | null }) => row.v?.length ?? 0,
    };
    expect(toCsv(columns, [{ v: 'a,"b"\n' }, { v: null }])).toBe('name,length\r\n"a,""b""\n",6\r\n,0\r\n');
  });

  it("does not let a text begin like a formula, and leaves numbers alone", () => {
    expect(toCsv<string>({ text: (row) => row, number: () => -1 }, ["=1+1"])).toBe(
      "text,number\r\n'=1+1,-1\r\n",
    );
  });
});

describe("a range of bytes (RFC 9110, section 14)", () => {
  it.each([
    ["bytes=0-9", { start: 0, end: 9 }],
    ["bytes=90-", { start: 90, end: 99 }],
    ["bytes=-10", { start: 90, end: 99 }],
    ["bytes=-1000", { start: 0, end: 99 }],
    ["bytes=50-1000", { start: 50, end: 99 }],
    ["bytes=100-", "unsatisfiable"],
    ["bytes=-0", "unsatisfiable"],
    ["bytes=9-0", null],
    ["bytes=0-1,5-6", null],
    ["lines=0-1", null],
    ["bytes=-", null],
    [null, null],
  ])("reads %s of 100 bytes as %j", (header, expected) => {
    expect(parseRange(header, 100)).toEqual(expected);
  });
});
