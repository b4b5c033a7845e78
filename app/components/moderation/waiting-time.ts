const minuteMs = 60_000;
const hourMs = 60 * minuteMs;
const dayMs = 24 * hourMs;

/** "3 d", "9 h", "12 min", as a queue is read. */
export function waitingTime(since: Date, now: number): string {
  const ms = Math.max(0, now - since.getTime());
  if (ms >= dayMs) return `${Math.floor(ms / dayMs)} d`;
  if (ms >= hourMs) return `${Math.floor(ms / hourMs)} h`;
  return `${Math.floor(ms / minuteMs)} min`;
}
