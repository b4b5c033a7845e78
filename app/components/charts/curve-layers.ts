import { formatError } from "@/app/components/ui/figures";
import type { ChartFrame } from "./chart-frame";
import { displayFont, familiesWithDots, familyScales, figureFont } from "./chart-theme";
import type { Curve } from "./curve";
import { endLabels } from "./end-labels";
import type { Layer } from "./paper-layers";

const family = (scale: { domain: string[]; range: unknown[] }) => ({
  field: "family",
  type: "nominal" as const,
  scale: scale as { domain: string[]; range: string[] },
  legend: null,
});

const weights = { normal: 1.7, thin: 1, strong: 2.2 };

/** Lines by the interpolant, marks at the runs. */
export function curveLayers(curves: readonly Curve[]): Layer[] {
  const kinds = [...new Set(curves.map((curve) => curve.weight))];
  const lines = kinds.map((weight): Layer => {
    const drawn = curves.filter((curve) => curve.weight === weight);
    return {
      data: {
        values: drawn.flatMap(({ id, family, line }) =>
          line.map(({ nodesPerAxis, error }) => ({ id, family, n: nodesPerAxis, error })),
        ),
      },
      mark: {
        type: "line",
        strokeWidth: weights[weight],
        strokeJoin: "round",
        opacity: weight === "thin" ? 0.55 : 1,
      },
      encoding: {
        detail: { field: "id" },
        stroke: family(familyScales.colour),
        strokeDash: family(familyScales.dash),
      },
    };
  });
  const marked = curves.filter((curve) => curve.hasMarks).flatMap(marksOf);
  return [
    ...lines,
    {
      data: { values: marked },
      mark: { type: "point", size: 74, opacity: 1 },
      encoding: {
        shape: family(familyScales.shape),
        fill: family(familyScales.fill),
        stroke: family(familyScales.outline),
        strokeWidth: { ...family(familyScales.outlineWidth), type: "ordinal" },
        tooltip: { field: "said", type: "nominal" },
      },
    },
    {
      data: { values: marked.filter((mark) => familiesWithDots.includes(mark.family)) },
      mark: { type: "point", shape: "circle", size: 7, strokeWidth: 0, opacity: 1 },
      encoding: { fill: family(familyScales.dot), tooltip: { field: "said", type: "nominal" } },
    },
  ];
}

function marksOf({ name, family, points }: Curve) {
  return points.map(({ nodesPerAxis, error }) => ({
    family,
    n: nodesPerAxis,
    error,
    said: `${name}: ${formatError(error)} at N = ${Math.round(nodesPerAxis)}`,
  }));
}

/** Names at the right, each with a thin leader from the end of its curve. */
export function labelLayers(curves: readonly Curve[], frame: ChartFrame, useShort: boolean): Layer[] {
  const gap = useShort ? 5 : 14;
  const labels = endLabels(curves, frame, useShort).map((label) => ({
    ...label,
    from: Math.min(label.x + 6, frame.width),
    edge: frame.width,
    to: frame.width + gap - 3,
  }));
  const pixel = (field: string) => ({ field, type: "quantitative" as const, scale: null, axis: null });
  const leader = { type: "rule" as const, strokeWidth: 1, opacity: 0.45 };
  return [
    {
      data: { values: labels.filter((label) => label.edge - label.from > 4) },
      mark: leader,
      encoding: {
        x: pixel("from"),
        x2: { field: "edge" },
        y: pixel("y"),
        y2: { field: "y" },
        stroke: family(familyScales.colour),
      },
    },
    {
      data: { values: labels },
      mark: leader,
      encoding: {
        x: pixel("edge"),
        x2: { field: "to" },
        y: pixel("y"),
        y2: { field: "labelY" },
        stroke: family(familyScales.colour),
      },
    },
    {
      data: { values: labels },
      mark: {
        type: "text",
        align: "left",
        baseline: "middle",
        font: figureFont,
        fontSize: 13,
        fontWeight: 500,
        dx: 3,
      },
      encoding: {
        x: pixel("to"),
        y: pixel("labelY"),
        text: { field: "text" },
        fill: family(familyScales.colour),
      },
    },
  ];
}

/** A triangle's long side of the formal or observed order, named. */
export function slopeLayers(slope: {
  order: number;
  from: { n: number; error: number };
  toNodes: number;
}): Layer[] {
  const { order, from, toNodes } = slope;
  const end = { n: toNodes, error: from.error * (from.n / toNodes) ** order };
  const line = { stroke: "var(--ink)", strokeWidth: 1, fill: "transparent" };
  return [
    {
      data: { values: [from, end] },
      mark: { type: "line", ...line, strokeDash: [2, 3] },
    },
    {
      data: {
        values: [{ n: from.n, error: from.error }, { n: from.n, error: end.error }, end].map((at, order) => ({
          ...at,
          order,
        })),
      },
      mark: { type: "line", ...line, opacity: 0.5 },
      encoding: { order: { field: "order", type: "quantitative" } },
    },
    {
      data: { values: [{ n: Math.sqrt(from.n * toNodes), error: end.error }] },
      mark: {
        type: "text",
        text: `slope ${Number(order.toFixed(2))}`,
        font: displayFont,
        fontStyle: "italic",
        fontSize: 15,
        baseline: "top",
        align: "center",
        dy: 5,
        fill: "var(--ink)",
      },
    },
  ];
}
