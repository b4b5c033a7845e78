import type { Refusal } from "@/benchmarks/scoring/data-error";

/** What the action at /submit answers where it takes nothing. */
export interface SubmitRefusal {
  message: string;
  /** Sentences by JSON path of the `submission` part. */
  fields: Record<string, string>;
  refusals: Refusal[];
  /** What was typed into a form that was sent without a script. */
  values: Record<string, string>;
}

export type SendOutcome =
  | { kind: "received"; address: string }
  | { kind: "refused"; refusal: SubmitRefusal }
  | { kind: "broken"; message: string }
  | { kind: "cancelled" };

export interface Sending {
  outcome: Promise<SendOutcome>;
  cancel(): void;
}

/** The page that answers carries the refusal here, since an upload with progress cannot read the router's own format. */
export const refusalElementId = "submit-refusal";

/** One POST of the part and all files; fetch would not tell how much of it has gone out. */
export function sendSubmission(
  address: string,
  part: unknown,
  files: { name: string; file: File }[],
  onProgress: (sentBytes: number) => void,
): Sending {
  const body = new FormData();
  body.append("submission", JSON.stringify(part));
  for (const { name, file } of files) body.append("files", file, name);
  const request = new XMLHttpRequest();
  const outcome = new Promise<SendOutcome>((resolve) => {
    request.upload.addEventListener("progress", (event) => onProgress(event.loaded));
    request.addEventListener("load", () => resolve(outcomeOf(request)));
    request.addEventListener("abort", () => resolve({ kind: "cancelled" }));
    request.addEventListener("error", () =>
      resolve({
        kind: "broken",
        message:
          "The connection broke off before the server answered. Nothing was stored; send the files again.",
      }),
    );
  });
  request.responseType = "document";
  request.open("POST", address);
  request.send(body);
  return { outcome, cancel: () => request.abort() };
}

function outcomeOf(request: XMLHttpRequest): SendOutcome {
  const { pathname } = new URL(request.responseURL, window.location.href);
  if (request.status < 400 && /^\/submissions\/[0-9a-f-]{36}$/.test(pathname)) {
    return { kind: "received", address: pathname };
  }
  if (pathname === "/sign-in") {
    return {
      kind: "broken",
      message: "Your session has ended. Sign in again in another tab, then send the files from here.",
    };
  }
  const text = request.responseXML?.getElementById(refusalElementId)?.dataset.refusal;
  if (text) return { kind: "refused", refusal: JSON.parse(text) as SubmitRefusal };
  const detail = request.responseXML?.querySelector("main h1")?.textContent;
  return {
    kind: "broken",
    message: `The server answered ${request.status}${detail ? ` (${detail})` : ""}. Nothing was stored.`,
  };
}

/** How much of each file has gone out, from the bytes of the whole body; the part and the separators come first. */
export function shareSent(sizes: number[], sentBytes: number): number[] {
  let before = 0;
  return sizes.map((size) => {
    const share = size === 0 ? Number(sentBytes >= before) : (sentBytes - before) / size;
    before += size;
    return Math.min(1, Math.max(0, share));
  });
}
