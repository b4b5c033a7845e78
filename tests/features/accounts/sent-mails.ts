import { sql } from "drizzle-orm";
import { db } from "@/app/platform/db.server";

interface SentMail {
  to: string;
  subject: string;
  text: string;
}

/** The mails that were queued for an address, in the order in which they were. */
export async function sentMails(to: string): Promise<SentMail[]> {
  const { rows } = await db.execute<{ data: SentMail }>(
    sql`select data from pgboss.job where name = 'send-mail' and data->>'to' = ${to} order by created_on`,
  );
  return rows.map((row) => row.data);
}

/** The secret of the mail's link. */
export function linkIn(mail: SentMail, page: "verify" | "reset"): string {
  const match = new RegExp(`/${page}/([\\w-]+)`).exec(mail.text);
  if (!match) throw new RangeError(`The mail "${mail.subject}" has no link to /${page}/.`);
  return match[1];
}
