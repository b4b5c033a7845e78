/** A name for a session that its owner recognises; a guess, as user agents are. */
export function browserOf(userAgent: string | null): string {
  if (userAgent === null) return "not named";
  const browser = names.find(([pattern]) => pattern.test(userAgent))?.[1];
  const system = systems.find(([pattern]) => pattern.test(userAgent))?.[1];
  if (browser === undefined) return userAgent.slice(0, 40);
  return system === undefined ? browser : `${browser} on ${system}`;
}

// The first that fits: Edge and Opera name Chrome too, and Chrome names Safari.
const names: [RegExp, string][] = [
  [/Edg\//, "Edge"],
  [/OPR\//, "Opera"],
  [/Firefox\//, "Firefox"],
  [/Chrom(e|ium)\//, "Chrome"],
  [/Safari\//, "Safari"],
];

const systems: [RegExp, string][] = [
  [/Android/, "Android"],
  [/iPhone|iPad/, "iOS"],
  [/Windows/, "Windows"],
  [/Mac OS X/, "macOS"],
  [/Linux/, "Linux"],
];
