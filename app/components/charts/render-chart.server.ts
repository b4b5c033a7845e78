import { createHash } from "node:crypto";
import { parse, View } from "vega";
import { compile, type TopLevelSpec } from "vega-lite";
import { expressionInterpreter } from "vega-interpreter";

const mostKept = 200;
const kept = new Map<string, Promise<string>>();

/** A specification drawn as SVG, without a canvas; the same content is drawn once. */
export function renderChart(spec: TopLevelSpec): Promise<string> {
  const key = createHash("sha256").update(JSON.stringify(spec)).digest("base64");
  const known = kept.get(key);
  if (known) {
    // Moved to the end, so that the least used goes first.
    kept.delete(key);
    kept.set(key, known);
    return known;
  }
  const drawn = draw(spec);
  kept.set(key, drawn);
  drawn.catch(() => kept.delete(key));
  if (kept.size > mostKept) kept.delete(kept.keys().next().value ?? "");
  return drawn;
}

async function draw(spec: TopLevelSpec): Promise<string> {
  const runtime = parse(compile(spec).spec, undefined, { ast: true });
  const view = new View(runtime, { renderer: "none", expr: expressionInterpreter });
  try {
    return shorten(await view.toSVG());
  } finally {
    view.finalize();
  }
}

/** Tenths of a pixel are enough; Vega writes every digit. */
function shorten(svg: string): string {
  return svg.replace(/ (d|transform)="([^"]*)"/g, (_, name: string, value: string) => {
    const rounded = value.replace(/-?\d+\.\d+/g, (digits) => String(Math.round(Number(digits) * 10) / 10));
    return ` ${name}="${rounded}"`;
  });
}
