import { z } from "zod";
import { invalid } from "@/app/platform/errors";

const text = (pattern: RegExp, sentence: string) =>
  z.preprocess((given) => given || null, z.string().trim().regex(pattern, sentence).nullable().default(null));

const auditLogQuery = z.object({
  action: text(/^[a-zA-Z]{1,40}(\.[a-zA-Z]{1,40})?$/, "Give a kind of event, such as submission.listed."),
  actor: text(/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/, "Give an account's id."),
  subject: text(/^[\w.-]{1,80}$/, "Give the id of what the event is about."),
  cursor: text(/^\d{1,15}$/, "Use the link to the next page."),
});
export type AuditLogQuery = z.infer<typeof auditLogQuery>;

export function parseAuditLogQuery(search: URLSearchParams): AuditLogQuery {
  const parsed = auditLogQuery.safeParse(Object.fromEntries(search));
  if (parsed.success) return parsed.data;
  const fields = Object.fromEntries(
    parsed.error.issues.map((issue) => [String(issue.path[0]), issue.message]),
  );
  throw invalid(`The log cannot be filtered so. ${Object.values(fields).join(" ")}`, fields);
}
