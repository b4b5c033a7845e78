/** Where to go after sign-in: a path of this site and nothing else, however the address is written. */
export function nextPath(asked: string | null, fallback = "/account"): string {
  if (asked === null || !asked.startsWith("/")) return fallback;
  const base = "http://this.invalid";
  // The browser's own reading decides: it takes "/\host" and "/<tab>/host" for another site.
  if (!URL.canParse(asked, base)) return fallback;
  const url = new URL(asked, base);
  if (url.origin !== base || url.pathname.startsWith("//")) return fallback;
  return url.pathname + url.search + url.hash;
}
