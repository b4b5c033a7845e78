import type { ReactNode } from "react";

export type NoticeTone = "ok" | "warn" | "bad" | "plain";

const tones: Record<NoticeTone, string> = {
  ok: "border-ok bg-ok-wash",
  warn: "border-warn bg-warn-wash",
  bad: "border-bad bg-bad-wash",
  plain: "border-ink-2 bg-sheet",
};

/** Something the reader should know before going on. A refusal interrupts, anything else waits its turn. */
export function Notice({ tone = "plain", children }: { tone?: NoticeTone; children: ReactNode }) {
  return (
    <div
      role={tone === "bad" ? "alert" : "status"}
      className={`my-4 max-w-[74ch] border-l-3 px-4 py-2.5 text-14 text-pretty ${tones[tone]}`}
    >
      {children}
    </div>
  );
}
