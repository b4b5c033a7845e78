import { useEffect, useRef, useState } from "react";
import { useBlocker } from "react-router";
import { sendSubmission, type Sending, type SendOutcome } from "./send-submission";
import type { UploadRow } from "./upload-rows";

export interface SendingState {
  /** Bytes that have gone out; null while nothing is being sent. */
  sentBytes: number | null;
  send: (address: string, part: unknown, rows: UploadRow[]) => Promise<SendOutcome>;
  cancel: () => void;
}

/** One upload at a time; leaving the page ends it. */
export function useSending(): SendingState {
  const [sentBytes, setSentBytes] = useState<number | null>(null);
  const sending = useRef<Sending | null>(null);
  useEffect(() => () => sending.current?.cancel(), []);

  const send: SendingState["send"] = async (address, part, rows) => {
    setSentBytes(0);
    sending.current = sendSubmission(address, part, rows, setSentBytes);
    const outcome = await sending.current.outcome;
    sending.current = null;
    setSentBytes(null);
    return outcome;
  };
  return { sentBytes, send, cancel: () => sending.current?.cancel() };
}

const question = "The files on this page have not been sent. Leave all the same?";

/** Asks before files that were not sent are left behind, by a link or by closing the page. */
export function useLeaveGuard(isGuarded: () => boolean): void {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => isGuarded() && nextLocation.pathname !== currentLocation.pathname,
  );
  useEffect(() => {
    if (blocker.state !== "blocked") return;
    if (window.confirm(question)) blocker.proceed();
    else blocker.reset();
  }, [blocker]);
  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (isGuarded()) event.preventDefault();
    };
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [isGuarded]);
}
