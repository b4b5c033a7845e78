import { env } from "@/app/platform/env.server";

export interface Mail {
  to: string;
  subject: string;
  text: string;
}

const ending = "The link works once, for one hour.\n\nBacksight, register of solver accuracy\n";

export function verificationMail(to: string, secret: string): Mail {
  return {
    to,
    subject: "Verify your e-mail address",
    text:
      "An account was made with this e-mail address. To verify the address, open\n\n" +
      `${address(`/verify/${secret}`)}\n\n` +
      "If you did not ask for an account, do nothing: without verification it cannot hand anything in.\n" +
      ending,
  };
}

/** To somebody who has an account already and asked for another: the page answered as to a newcomer. */
export function alreadyJoinedMail(to: string, secret: string): Mail {
  return {
    to,
    subject: "You have an account already",
    text:
      "An account was asked for with this e-mail address, which has one already. To set a new password for it, open\n\n" +
      `${address(`/reset/${secret}`)}\n\n` +
      "If you did not ask, do nothing: nothing has changed.\n" +
      ending,
  };
}

export function resetMail(to: string, secret: string): Mail {
  return {
    to,
    subject: "Set a new password",
    text:
      "A new password was asked for. To set it, open\n\n" +
      `${address(`/reset/${secret}`)}\n\n` +
      "If you did not ask, do nothing: your password stays as it is.\n" +
      ending,
  };
}

export function noAccountMail(to: string): Mail {
  return {
    to,
    subject: "No account with this address",
    text:
      "A new password was asked for, but no account uses this e-mail address.\n" +
      "If you did not ask, do nothing. You may have joined with another address; to make an account, open\n\n" +
      `${address("/join")}\n\n` +
      "Backsight, register of solver accuracy\n",
  };
}

function address(path: string): string {
  return new URL(path, env.PUBLIC_URL).href;
}
