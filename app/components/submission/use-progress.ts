import { useEffect, useState } from "react";
import { useRevalidator } from "react-router";
import type { SubmissionState } from "@/drizzle/enums";

/** What the server tells while it scores. */
export interface Progress {
  state: SubmissionState;
  runs: number;
  scored: number;
  refused: number;
}

/**
 * Follows a submission and has the page read anew what has changed. A connection that breaks off is taken up again
 * by the browser; each event says how things stand, so nothing is lost by it.
 */
export function useProgress(id: string, shown: Progress): Progress {
  const [latest, setLatest] = useState<Progress | null>(null);
  const { revalidate, state } = useRevalidator();
  const isFollowed = shown.state === "checking" || shown.state === "inReview";
  useEffect(() => {
    if (!isFollowed) return;
    const source = new EventSource(`/submissions/${id}/progress`);
    source.addEventListener("progress", (event: MessageEvent<string>) => {
      setLatest(JSON.parse(event.data) as Progress);
    });
    return () => source.close();
  }, [id, isFollowed]);

  const isStale = latest !== null && isFollowed && !isSame(latest, shown);
  useEffect(() => {
    if (isStale && state === "idle") void revalidate();
  }, [isStale, state, latest, revalidate]);
  return isFollowed && latest ? latest : shown;
}

function isSame(a: Progress, b: Progress): boolean {
  return a.state === b.state && a.scored === b.scored && a.refused === b.refused;
}
