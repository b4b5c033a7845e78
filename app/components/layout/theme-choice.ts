export const themes = ["light", "dark"] as const;
export type Theme = (typeof themes)[number];

const cookieName = "theme";
const yearSeconds = 31_536_000;

/** The reader's choice from a Cookie header; null where the system's is to be followed. */
export function readTheme(cookies: string | null): Theme | null {
  const pairs = (cookies ?? "").split(";").map((pair) => pair.trim());
  const value = pairs.find((pair) => pair.startsWith(`${cookieName}=`))?.slice(cookieName.length + 1);
  return themes.find((theme) => theme === value) ?? null;
}

/** Text for `document.cookie` that keeps the choice for a year. */
export function themeCookie(theme: Theme, isSecure: boolean): string {
  const secure = isSecure ? "; Secure" : "";
  return `${cookieName}=${theme}; Path=/; Max-Age=${yearSeconds}; SameSite=Lax${secure}`;
}
