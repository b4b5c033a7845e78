import { Form, Link } from "react-router";
import { Button } from "@/app/components/ui/button";
import { Field } from "@/app/components/ui/field";
import { Ledger } from "@/app/components/ui/ledger";
import { Select } from "@/app/components/ui/select";
import { TextInput } from "@/app/components/ui/text-input";
import type { AuditLogQuery } from "@/app/features/moderation/audit-log-query";
import type { AuditLogItem } from "@/app/features/moderation/moderation-view";
import { ModerationTabs } from "./moderation-page";

interface AuditLogPageProps {
  query: AuditLogQuery;
  log: { items: AuditLogItem[]; nextCursor: string | null };
  actions: string[];
}

export function AuditLogPage({ query, log, actions }: AuditLogPageProps) {
  return (
    <>
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1 pt-8">
        <h1 className="text-34">Audit log</h1>
        <p className="text-ink-2">It is only added to. It holds account ids, never names or addresses.</p>
      </div>
      <div className="mt-3.5 border-b border-hair pb-2.5">
        <ModerationTabs current={null} counts={null} />
      </div>
      <AuditLogFilter query={query} actions={actions} />
      <AuditLogLedger items={log.items} />
      <p className="mt-3.5 flex gap-6 text-14">
        {query.cursor ? <Link to={addressOf(query, null)}>Newest</Link> : null}
        {log.nextCursor ? <Link to={addressOf(query, log.nextCursor)}>Older</Link> : null}
      </p>
    </>
  );
}

function addressOf(query: AuditLogQuery, cursor: string | null): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries({ ...query, cursor })) if (value) search.set(name, value);
  return search.size > 0 ? `/moderation/log?${search}` : "/moderation/log";
}

function AuditLogFilter({ query, actions }: { query: AuditLogQuery; actions: string[] }) {
  return (
    <Form method="get" className="grid items-end gap-x-6 pt-4 md:grid-cols-[1fr_2fr_2fr_auto]">
      <Field label="Event">
        <Select name="action" defaultValue={query.action ?? ""}>
          <option value="">any event</option>
          {actions.map((action) => (
            <option key={action} value={action}>
              {action}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Account's id">
        <TextInput name="actor" defaultValue={query.actor ?? ""} className="font-figure" autoComplete="off" />
      </Field>
      <Field label="Id of the subject">
        <TextInput
          name="subject"
          defaultValue={query.subject ?? ""}
          className="font-figure"
          autoComplete="off"
        />
      </Field>
      <div className="mb-4">
        <Button type="submit">Filter</Button>
      </div>
    </Form>
  );
}

function AuditLogLedger({ items }: { items: AuditLogItem[] }) {
  if (items.length === 0) return <p className="mt-6 text-17">No event matches.</p>;
  return (
    <div className="overflow-x-auto">
      <Ledger caption="Events, newest first" isCaptionHidden>
        <thead>
          <tr>
            <th scope="col" className="num">
              No.
            </th>
            <th scope="col">At, UTC</th>
            <th scope="col">Event</th>
            <th scope="col">Account</th>
            <th scope="col">Subject</th>
            <th scope="col">Detail</th>
            <th scope="col">Hash</th>
          </tr>
        </thead>
        <tbody>
          {items.map((item) => (
            <tr key={item.id}>
              <td className="num">{item.id}</td>
              <td className="font-figure whitespace-nowrap">
                <time dateTime={item.at.toISOString()}>
                  {item.at.toISOString().slice(0, 19).replace("T", " ")}
                </time>
              </td>
              <th scope="row" className="font-figure">
                {item.action}
              </th>
              <td className="font-figure text-13">
                {item.actorId ? <IdLink name="actor" id={item.actorId} /> : "the register"}
              </td>
              <td className="font-figure text-13">
                {item.subjectKind} <IdLink name="subject" id={item.subjectId} />
              </td>
              <td className="font-figure text-12 break-all">{detailOf(item.detail)}</td>
              <td
                className="font-figure text-12 text-ink-2"
                title={`${item.hash}, after ${item.previousHash}`}
              >
                {item.hash.slice(0, 12)}
              </td>
            </tr>
          ))}
        </tbody>
      </Ledger>
    </div>
  );
}

/** Filters by this id; it is shown by its beginning, the whole on hover. */
function IdLink({ name, id }: { name: "actor" | "subject"; id: string }) {
  return (
    <Link to={`/moderation/log?${name}=${id}`} title={id}>
      {id.slice(0, 8)}
    </Link>
  );
}

function detailOf(detail: Record<string, unknown>): string {
  const entries = Object.entries(detail).filter(([, value]) => value !== null);
  return entries
    .map(([name, value]) => `${name}: ${typeof value === "string" ? value : JSON.stringify(value)}`)
    .join(", ");
}
