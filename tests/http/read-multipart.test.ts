import { createHash } from "node:crypto";
import type { Readable } from "node:stream";
import { describe, expect, it } from "vitest";
import { readMultipart, type FileSink } from "@/app/http/read-multipart.server";
import type { UploadLimits } from "@/app/http/upload-limits";
import { multipartRequest, type MultipartPart } from "../support/multipart";

const limits: UploadLimits = { fileBytes: 100_000, files: 3, totalBytes: 200_000, fieldBytes: 10_000 };

const submission: MultipartPart = {
  name: "submission",
  content: '{"problem":"p"}',
  type: "application/json",
};
const file = (filename: string, sizeBytes: number): MultipartPart => ({
  name: "files",
  filename,
  content: Buffer.alloc(sizeBytes, filename),
});

/** Keeps what arrived, and how many sinks are still open. */
function collector() {
  const state = { openSinks: 0, ended: 0 };
  const sink: FileSink<Buffer> = async (_name, stream: Readable) => {
    state.openSinks += 1;
    const chunks: Buffer[] = [];
    try {
      for await (const chunk of stream as AsyncIterable<Buffer>) chunks.push(chunk);
      state.ended += 1;
      return Buffer.concat(chunks);
    } finally {
      state.openSinks -= 1;
    }
  };
  return { state, sink };
}

const read = (parts: MultipartPart[], options = {}) => {
  const { state, sink } = collector();
  return { state, answer: readMultipart(multipartRequest(parts, options), limits, sink) };
};

describe("reading a multipart body", () => {
  it.each([
    ["before", [submission, file("a.npy", 70_000), file("b.npy", 1000)]],
    ["between", [file("a.npy", 70_000), submission, file("b.npy", 1000)]],
    ["after", [file("a.npy", 70_000), file("b.npy", 1000), submission]],
  ])("accepts the submission part %s the files", async (_where, parts) => {
    const { answer } = read(parts);
    const { submission: parsed, files } = await answer;
    expect(parsed).toEqual({ problem: "p" });
    expect(files.map(({ name, sizeBytes }) => [name, sizeBytes])).toEqual([
      ["a.npy", 70_000],
      ["b.npy", 1000],
    ]);
  });

  it("takes the SHA-256 of exactly the bytes that the sink gets, whatever the chunks", async () => {
    for (const chunkBytes of [1, 7, 1000]) {
      const { answer } = read([submission, file("a.npy", 3000)], { chunkBytes });
      const { files } = await answer;
      expect(files[0].kept).toEqual(Buffer.alloc(3000, "a.npy"));
      expect(files[0].sha256).toBe(createHash("sha256").update(files[0].kept).digest("hex"));
    }
  });

  it("accepts the submission part with a file name, as curl sends it", async () => {
    const { answer } = read([{ ...submission, filename: "submission.json" }, file("a.npy", 10)]);
    expect((await answer).submission).toEqual({ problem: "p" });
  });

  it("accepts a file of exactly the limit and refuses one byte more", async () => {
    expect((await read([submission, file("a.npy", 100_000)]).answer).files[0].sizeBytes).toBe(100_000);
    const { answer } = read([submission, file("a.npy", 100_001)]);
    await expect(answer).rejects.toMatchObject({
      kind: "tooLarge",
      message: expect.stringContaining("a.npy"),
    });
  });

  it("refuses files that are together over the limit, and more files than the limit", async () => {
    const heavy = [submission, file("a.npy", 90_000), file("b.npy", 90_000), file("c.npy", 30_000)];
    await expect(read(heavy).answer).rejects.toMatchObject({ kind: "tooLarge" });
    const many = [submission, ...["a", "b", "c", "d"].map((name) => file(name, 10))];
    await expect(read(many).answer).rejects.toMatchObject({
      kind: "tooLarge",
      message: expect.stringContaining("3 files"),
    });
  });

  it("refuses two files of one name, also where only their folders differ", async () => {
    await expect(read([submission, file("a.npy", 10), file("a.npy", 10)]).answer).rejects.toMatchObject({
      kind: "invalid",
      message: expect.stringContaining("Two files are named a.npy"),
    });
    const folders = [submission, file("x/a.npy", 10), file("y/a.npy", 10)];
    await expect(read(folders).answer).rejects.toMatchObject({ kind: "invalid" });
  });

  it("keeps the last part of a path and drops characters that turn the reading direction", async () => {
    const { answer } = read([submission, file("../../etc/n0\u202e32.npy", 10)]);
    expect((await answer).files[0].name).toBe("n032.npy");
  });

  it.each([
    ["a missing submission part", [file("a.npy", 10)], "missing"],
    ["a submission part that is not JSON", [{ ...submission, content: "{" }, file("a.npy", 10)], "not JSON"],
    ["a submission part sent twice", [submission, submission], "twice"],
    ["a submission part over its limit", [{ ...submission, content: `"${"x".repeat(10_001)}"` }], "larger"],
    ["a file in a part of another name", [submission, { ...file("a.npy", 10), name: "data" }], "named data"],
    ["bytes without a file name", [submission, { ...file("", 10) }], "without a name"],
  ])("refuses %s", async (_what, parts, words) => {
    await expect(read(parts).answer).rejects.toThrow(words);
  });

  it("leaves out an empty file input of a form", async () => {
    const { answer } = read([submission, { name: "files", filename: "", content: "" }, file("a.npy", 10)]);
    expect((await answer).files.map(({ name }) => name)).toEqual(["a.npy"]);
  });

  it("refuses a body that breaks off or ends early, after every sink has ended", async () => {
    for (const options of [{ breaksOff: true, isTruncated: true }, { isTruncated: true }]) {
      const { answer, state } = read([submission, file("a.npy", 90_000)], options);
      await expect(answer).rejects.toMatchObject({ kind: "invalid" });
      expect(state).toEqual({ openSinks: 0, ended: 0 });
    }
  });

  it("has ended every sink when it refuses", async () => {
    const { answer, state } = read([submission, file("a.npy", 50_000), file("b.npy", 100_001)]);
    await expect(answer).rejects.toMatchObject({ kind: "tooLarge" });
    expect(state.openSinks).toBe(0);
  });

  it("passes on the first failure of a sink and does not wait for ever on its file", async () => {
    const outage = new Error("storage is not reachable");
    const sink: FileSink<never> = () => Promise.reject(outage);
    const request = multipartRequest([submission, file("a.npy", 90_000), file("b.npy", 90_000)]);
    await expect(readMultipart(request, limits, sink)).rejects.toBe(outage);
  });

  it("refuses other content types", async () => {
    const request = new Request("http://127.0.0.1/", { method: "POST", body: "{}" });
    await expect(readMultipart(request, limits, collector().sink)).rejects.toMatchObject({ kind: "invalid" });
  });
});
