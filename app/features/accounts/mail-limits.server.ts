import { countAttempt } from "./throttle.server";

/** Limits the mails that anyone can make this register send: to one recipient, and from one network address. */
export async function countMail(recipient: string, address: string | null): Promise<void> {
  const rules = [{ what: "mail by recipient", subject: recipient, limit: 5 }];
  if (address !== null) rules.push({ what: "mail by address", subject: address, limit: 30 });
  await countAttempt(rules, {
    windowSeconds: 3600,
    message: "Too many mails were asked for. Wait, then try again.",
  });
}
