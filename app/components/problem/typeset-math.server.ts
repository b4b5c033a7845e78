import katex from "katex";

const mostKept = 2000;
const kept = new Map<string, string>();

/** A formula as MathML, for STIX Two Math; the markup is sent, KaTeX stays on the server. */
export function typesetMath(latex: string, { isDisplay = false }: { isDisplay?: boolean } = {}): string {
  const key = `${isDisplay ? "d" : "i"}${latex}`;
  const known = kept.get(key);
  if (known !== undefined) return known;
  const markup = katex
    .renderToString(latex, { output: "mathml", displayMode: isDisplay, throwOnError: false })
    .replace(/<annotation[^>]*>[\s\S]*?<\/annotation>/g, "");
  if (kept.size >= mostKept) kept.clear();
  kept.set(key, markup);
  return markup;
}
