/** Characters that a name may not carry into a header or a page: control characters and bidirectional overrides. */
// eslint-disable-next-line no-control-regex -- control characters are what is taken out
const unwanted = /[\u0000-\u001f\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069]/g;

/** The last part of a path, normalised, without unwanted characters, at most 200 characters; "" where nothing is left. */
export function sanitiseFileName(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? "";
  const clean = last.normalize("NFC").replace(unwanted, "").trim().slice(0, 200);
  return clean === "." || clean === ".." ? "" : clean;
}
