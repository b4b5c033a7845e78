import { StateMark } from "@/app/components/ui/state-mark";
import type { Progress } from "./use-progress";

/** How far the scoring is; told once to those who hear the page when it ends. */
export function ProgressPanel({ progress }: { progress: Progress }) {
  const { runs, scored, refused, state } = progress;
  if (state !== "checking") return null;
  const done = scored + refused;
  return (
    <div className="my-4 border-y border-hair py-3" role="status">
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        <StateMark state="running">{done === 0 ? "waits for the scorer" : "scoring"}</StateMark>
        <progress value={done} max={Math.max(runs, 1)} aria-label="Runs scored" className="sr-only" />
        <span aria-hidden="true" className="flex h-[9px] w-44 border border-ink">
          <span className="block h-full bg-ink" style={{ width: `${(100 * done) / Math.max(runs, 1)}%` }} />
        </span>
        <span className="text-14">
          <span className="fig">
            {done} of {runs}
          </span>{" "}
          runs scored. This page follows by itself.
        </span>
      </div>
    </div>
  );
}
