import type { z } from "zod";
import { invalid, tooLarge } from "@/app/platform/errors";

const mostBytes = 65_536;

/** The checked fields of a small form; files come through the upload instead. A refusal names each field. */
export async function readForm<Schema extends z.ZodType>(
  request: Request,
  schema: Schema,
): Promise<z.output<Schema>> {
  const parsed = schema.safeParse(fieldsOf(await readFields(request)));
  if (parsed.success) return parsed.data;
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) {
    const name = String(issue.path[0] ?? "form");
    fields[name] ??= issue.message;
  }
  throw invalid("The form is not complete.", fields);
}

/** The given texts but for passwords; a name that comes twice with its texts joined by commas. */
export async function valuesToShowAgain(request: Request): Promise<Record<string, string>> {
  const values: Record<string, string> = {};
  for (const [name, value] of await readFields(request)) {
    if (typeof value !== "string" || /password/i.test(name)) continue;
    values[name] = name in values ? `${values[name]},${value}` : value;
  }
  return values;
}

/** Reads a copy, so that a strategy or a second reader finds the body unread. */
async function readFields(request: Request): Promise<FormData> {
  const type = request.headers.get("content-type") ?? "";
  if (!/^(application\/x-www-form-urlencoded|multipart\/form-data)\b/i.test(type)) return new FormData();
  const body = await readCapped(request.clone());
  return new Response(body, { headers: { "content-type": type } }).formData();
}

/** A body without end would otherwise be held in memory whole before anyone looks at it. */
async function readCapped(request: Request): Promise<Uint8Array<ArrayBuffer>> {
  const declared = Number(request.headers.get("content-length") ?? 0);
  if (declared > mostBytes) throw formTooLarge();
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  for (;;) {
    const next = await reader?.read();
    if (!next || next.done) break;
    size += next.value.byteLength;
    if (size > mostBytes) throw formTooLarge();
    chunks.push(next.value);
  }
  return new Uint8Array(Buffer.concat(chunks));
}

function formTooLarge() {
  return tooLarge(`This form takes at most ${mostBytes / 1024} KiB.`);
}

/** A name that comes twice becomes a list. */
function fieldsOf(form: FormData): Record<string, FormDataEntryValue | FormDataEntryValue[]> {
  const fields: Record<string, FormDataEntryValue | FormDataEntryValue[]> = {};
  for (const name of new Set(form.keys())) {
    const all = form.getAll(name);
    fields[name] = all.length === 1 ? all[0] : all;
  }
  return fields;
}
