import { db } from "@/app/platform/db.server";
import { conflict } from "@/app/platform/errors";
import { enqueue } from "@/app/platform/queue.server";
import { verificationMail } from "./account-mail.server";
import { countMail } from "./mail-limits.server";
import { issueLink } from "./one-use-links.server";
import type { Viewer } from "./viewer";
import { requireAccount } from "./viewer-policy";

export async function resendVerification(viewer: Viewer): Promise<void> {
  const account = requireAccount(viewer);
  if (account.isEmailVerified) throw conflict("Your e-mail address is verified already.");
  await countMail(account.email, null);
  await db.transaction(async (tx) => {
    const secret = await issueLink(tx, account.userId, "verifyEmail");
    await enqueue(tx, "send-mail", verificationMail(account.email, secret));
  });
}
