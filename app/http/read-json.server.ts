import type { z } from "zod";
import { invalid, tooLarge } from "@/app/platform/errors";

const mostBytes = 65_536;

/** A small JSON body, checked against a schema; an empty body counts as an empty object. */
export async function readJson<Schema extends z.ZodType>(
  request: Request,
  schema: Schema,
): Promise<z.output<Schema>> {
  const parsed = schema.safeParse(parse(await readText(request)));
  if (parsed.success) return parsed.data;
  const fields = Object.fromEntries(
    parsed.error.issues.map((issue) => [issue.path.join(".") || "body", issue.message]),
  );
  throw invalid("The body does not have the expected fields.", fields);
}

async function readText(request: Request): Promise<string> {
  const chunks: Uint8Array[] = [];
  let sizeBytes = 0;
  const reader = request.body?.getReader();
  for (;;) {
    const next = await reader?.read();
    if (!next || next.done) return Buffer.concat(chunks).toString("utf8");
    sizeBytes += next.value.byteLength;
    if (sizeBytes > mostBytes) throw tooLarge(`This body takes at most ${mostBytes / 1024} KiB.`);
    chunks.push(next.value);
  }
}

function parse(text: string): unknown {
  if (text.trim() === "") return {};
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) throw invalid(`The body is not JSON: ${error.message}.`);
    throw error;
  }
}
