import busboy from "busboy";
import { createHash } from "node:crypto";
import { Readable, Transform } from "node:stream";
import type { ReadableStream as WebReadableStream } from "node:stream/web";
import { AppError, invalid, tooLarge } from "@/app/platform/errors";
import { mebibytes, type UploadLimits } from "./upload-limits";
import { sanitiseFileName } from "./upload-names";

/** Takes one file's bytes as they arrive: consumes the stream to its end, or rejects. */
export type FileSink<T> = (name: string, stream: Readable) => Promise<T>;

/** Makes the `submission` part from the other fields of a form that was sent without a script. */
export type PartFromFields = (fields: [name: string, value: string][], fileNames: string[]) => unknown;

export interface ReceivedFile<T> {
  name: string;
  sha256: string;
  sizeBytes: number;
  kept: T;
}

export interface Multipart<T> {
  /** The `submission` part, parsed. */
  submission: unknown;
  /** In the order sent. */
  files: ReceivedFile<T>[];
}

/**
 * Reads a multipart body as a stream: parts named `files` go to the sink as they arrive, the part `submission` may come
 * before, between or after them. When it throws, every sink has ended. After a refusal the rest of the body is read and
 * thrown away, up to twice the limit, so that a client that is still sending gets to read the answer.
 */
export async function readMultipart<T>(
  request: Request,
  limits: UploadLimits,
  sink: FileSink<T>,
  fromFields?: PartFromFields,
) {
  const contentType = request.headers.get("content-type") ?? "";
  if (!/^multipart\/form-data\s*;.*boundary=/i.test(contentType) || !request.body) {
    throw invalid("The body must be multipart/form-data with a part named submission and parts named files.");
  }
  return await new MultipartReader(limits, sink, fromFields).read(request, contentType);
}

class MultipartReader<T> {
  private failure: Error | null = null;
  private declareFailed: () => void = () => undefined;
  private readonly failed = new Promise<void>((resolve) => (this.declareFailed = resolve));
  private submissionText: string | null = null;
  private readonly fields: [name: string, value: string][] = [];
  private fieldBytes = 0;
  private totalBytes = 0;
  private readonly names = new Set<string>();
  private readonly openMeters = new Set<Transform>();
  private readonly received: Promise<ReceivedFile<T> | null>[] = [];

  constructor(
    private readonly limits: UploadLimits,
    private readonly sink: FileSink<T>,
    private readonly fromFields?: PartFromFields,
  ) {}

  async read(request: Request, contentType: string): Promise<Multipart<T>> {
    const source = Readable.fromWeb(request.body as WebReadableStream<Uint8Array>);
    const abort = () => source.destroy(new Error("aborted"));
    request.signal.addEventListener("abort", abort, { once: true });
    if (Number(request.headers.get("content-length")) > this.limits.totalBytes + this.limits.fieldBytes) {
      this.fail(this.overTotal());
    }
    await this.pump(source, this.createParser(contentType));
    request.signal.removeEventListener("abort", abort);
    const files = await Promise.all(this.received);
    const kept = files.filter((file) => file !== null);
    const submission = this.parseSubmission(kept.map((file) => file.name));
    if (this.failure !== null) throw this.failure;
    return { submission, files: kept };
  }

  /** Never rejects: what goes wrong is kept as the failure, the first one only. */
  private async pump(source: Readable, parser: busboy.Busboy): Promise<void> {
    let arrivedBytes = 0;
    try {
      for await (const chunk of source as AsyncIterable<Uint8Array>) {
        arrivedBytes += chunk.byteLength;
        if (this.failure === null) await this.write(parser, chunk);
        else if (arrivedBytes > 2 * this.limits.totalBytes) break;
      }
    } catch (error) {
      // Only the source can throw here: the connection is gone.
      this.fail(
        new AppError("invalid", `The upload broke off before its end (${String(error)}). Send it again.`),
      );
    }
    if (this.failure === null) await this.finish(parser);
  }

  private async write(parser: busboy.Busboy, chunk: Uint8Array): Promise<void> {
    if (parser.write(chunk)) return;
    await Promise.race([new Promise((resolve) => parser.once("drain", resolve)), this.failed]);
  }

  private async finish(parser: busboy.Busboy): Promise<void> {
    const closed = new Promise((resolve) => parser.once("close", resolve));
    parser.end();
    await Promise.race([closed, this.failed]);
  }

  private createParser(contentType: string): busboy.Busboy {
    const parser = busboy({
      headers: { "content-type": contentType },
      defParamCharset: "utf8",
      limits: { fieldSize: this.limits.fieldBytes + 1, parts: 200 },
    });
    parser.on("error", (error) => this.fail(invalid(`The multipart body cannot be read: ${String(error)}.`)));
    parser.on("partsLimit", () => this.fail(invalid("The body has more than 200 parts.")));
    parser.on("field", (name, value) => {
      if (name === "submission") this.keepSubmission(value);
      else this.keepField(name, value);
    });
    parser.on("file", (part, stream, info) => {
      if (part === "submission") this.collectSubmission(stream);
      else this.receiveFile(part, stream, info.filename);
    });
    return parser;
  }

  private receiveFile(part: string, stream: Readable, givenName: string | undefined): void {
    const name = sanitiseFileName(givenName ?? "");
    const refusal = this.refuseFile(part, name, Boolean(givenName));
    if (refusal) this.fail(refusal);
    if (this.failure !== null || !givenName) {
      // A form with an empty file input sends a part without a name and without bytes.
      stream
        .on("data", () => this.fail(invalid("A file was sent without a name.")))
        .on("error", () => stream.resume());
      return;
    }
    this.names.add(name);
    const meter = this.createMeter(name);
    stream.on("error", (error) => meter.stream.destroy(error));
    meter.stream.on("error", (error) => {
      this.fail(error);
      stream.unpipe(meter.stream).resume();
    });
    const kept = this.sink(name, stream.pipe(meter.stream));
    this.received.push(
      kept.then(
        (value) => ({ name, ...meter.measured(), kept: value }),
        (error: unknown) => {
          meter.stream.destroy(toError(error));
          this.fail(toError(error));
          return null;
        },
      ),
    );
  }

  private refuseFile(part: string, name: string, isNamed: boolean): AppError | null {
    if (part !== "files")
      return invalid(`A file came in a part named ${part}; files go into parts named files.`);
    if (!isNamed) return null;
    if (name === "") return invalid("A file's name holds nothing but characters that are not allowed.");
    if (this.names.has(name))
      return invalid(`Two files are named ${name}. Give each run's file a name of its own.`);
    if (this.names.size >= this.limits.files)
      return tooLarge(`More than ${this.limits.files} files were sent.`);
    return null;
  }

  /** Counts and hashes one file's bytes on their way. */
  private createMeter(name: string) {
    const hash = createHash("sha256");
    let sizeBytes = 0;
    const stream = new Transform({
      transform: (chunk: Buffer, _encoding, done) => {
        sizeBytes += chunk.byteLength;
        this.totalBytes += chunk.byteLength;
        if (sizeBytes > this.limits.fileBytes) {
          done(
            tooLarge(
              `The file ${name} is larger than ${mebibytes(this.limits.fileBytes)}, the limit for a file.`,
            ),
          );
        } else if (this.totalBytes > this.limits.totalBytes) {
          done(this.overTotal());
        } else {
          hash.update(chunk);
          done(null, chunk);
        }
      },
    });
    this.openMeters.add(stream);
    stream.once("close", () => this.openMeters.delete(stream));
    return { stream, measured: () => ({ sha256: hash.digest("hex"), sizeBytes }) };
  }

  private overTotal(): AppError {
    return tooLarge(
      `The files together are larger than ${mebibytes(this.limits.totalBytes)}, the limit for one upload.`,
    );
  }

  private fail(error: Error): void {
    if (this.failure !== null) return;
    this.failure = error;
    this.declareFailed();
    for (const meter of this.openMeters) meter.destroy(error);
  }

  /** Some clients send the JSON with a file name. */
  private collectSubmission(stream: Readable): void {
    const chunks: Buffer[] = [];
    let sizeBytes = 0;
    stream.on("data", (chunk: Buffer) => {
      sizeBytes += chunk.byteLength;
      if (sizeBytes <= this.limits.fieldBytes) chunks.push(chunk);
      else this.fail(this.overField());
    });
    stream.on("error", (error) => this.fail(invalid(`The submission part broke off: ${error.message}.`)));
    stream.on("end", () => this.keepSubmission(Buffer.concat(chunks).toString("utf8")));
  }

  private keepSubmission(text: string): void {
    if (this.submissionText !== null) this.fail(invalid("The part named submission was sent twice."));
    else if (Buffer.byteLength(text) > this.limits.fieldBytes) this.fail(this.overField());
    else this.submissionText = text;
  }

  private keepField(name: string, value: string): void {
    this.fieldBytes += Buffer.byteLength(name) + Buffer.byteLength(value);
    if (this.fieldBytes > this.limits.fieldBytes) this.fail(this.overField());
    else this.fields.push([name, value]);
  }

  private overField(): AppError {
    return tooLarge(`The submission part is larger than ${mebibytes(this.limits.fieldBytes)}.`);
  }

  private parseSubmission(fileNames: string[]): unknown {
    if (this.failure !== null) return null;
    if (this.submissionText === null && this.fromFields) return this.fromFields(this.fields, fileNames);
    if (this.submissionText === null) {
      this.fail(invalid("The part named submission is missing: JSON that describes the runs."));
      return null;
    }
    try {
      return JSON.parse(this.submissionText);
    } catch (error) {
      if (!(error instanceof SyntaxError)) throw error;
      this.fail(invalid(`The submission part is not JSON: ${error.message}.`));
      return null;
    }
  }
}

function toError(error: unknown): Error {
  return error instanceof Error ? error : new Error(String(error));
}
