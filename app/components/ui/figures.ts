/** The one format of each kind of figure, the same on the server and in every browser. */

/** `2.3e-6`; 0 for exactly zero. */
export function formatError(value: number, digits = 2): string {
  if (value === 0) return "0";
  if (!Number.isFinite(value)) return value > 0 ? "infinite" : "undefined";
  return value.toExponential(digits - 1).replace("e+", "e");
}

/** A tolerance as it was given: `1e-6`, `3.15e-4`. */
export function formatTolerance(value: number): string {
  return value.toExponential().replace("e+", "e");
}

/** `12 564`, in thin groups from five digits on. */
export function formatCount(value: number): string {
  const text = String(value);
  return text.length < 5 ? text : text.replace(/\B(?=(\d{3})+$)/g, "\u2009");
}

/** `48 × 48`, or `48` along one axis. */
export function formatNodes(n: readonly number[]): string {
  return n.map(formatCount).join(" × ");
}

/** `48 × 48 = 2304`, or `48` along one axis. */
export function formatTotalNodes(n: readonly number[]): string {
  if (n.length === 1) return formatCount(n[0]);
  return `${formatNodes(n)} = ${formatCount(n.reduce((product, count) => product * count, 1))}`;
}

/** `0.9 kB`, `12 kB`, `3.4 MB`: decimal units. */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  const power = bytes < 999_500 ? 1 : 2;
  const value = bytes / 1000 ** power;
  return `${value < 9.95 ? value.toFixed(1) : Math.round(value)} ${power === 1 ? "kB" : "MB"}`;
}

const units = [
  [1, "s"],
  [1e-3, "ms"],
  [1e-6, "µs"],
  [1e-9, "ns"],
] as const;

/** `0.41 ms`, three significant digits. */
export function formatSeconds(seconds: number): string {
  if (seconds === 0) return "0 s";
  const [size, unit] = units.find(([scale]) => seconds >= scale) ?? units[units.length - 1];
  return `${Number((seconds / size).toPrecision(3))} ${unit}`;
}

const day = new Intl.DateTimeFormat("en-GB", {
  day: "numeric",
  month: "long",
  year: "numeric",
  timeZone: "UTC",
});

/** `12 May 2026`. */
export function formatDay(date: Date): string {
  return day.format(date);
}

const shortDay = new Intl.DateTimeFormat("en-GB", { day: "2-digit", month: "short", timeZone: "UTC" });

/** `12 May`. */
export function formatShortDay(date: Date): string {
  return shortDay.format(date);
}

/** All 17 significant digits of a double, with no exponent where it is short without one. */
export function formatAllDigits(value: number): string {
  if (Number.isInteger(value) && Math.abs(value) < 1e15) return String(value);
  const text = value.toPrecision(17);
  return text.includes("e") ? text.replace(/\.?0+e\+?/, "e") : text.replace(/\.?0+$/, "");
}

/** A record's number in four digits. */
export function formatRecordNumber(number: number): string {
  return String(number).padStart(4, "0");
}
