import type { LayerSpec } from "vega-lite/types_unstable/spec/layer.js";
import type { UnitSpec } from "vega-lite/types_unstable/spec/unit.js";
import { type ChartFrame, errorShare, labelledTicks, nodeTicks } from "./chart-frame";
import { labelFont } from "./chart-theme";

export type Layer = LayerSpec<string> | UnitSpec<string>;

/** Left of the plot: the staff, then the figures. */
export const staff = { left: -16, right: -6 };

/** Scales and axes that all layers of a chart share. */
export function paperEncoding(
  frame: ChartFrame,
  titles: { x: string; y: string },
): LayerSpec<string>["encoding"] {
  const { nMin, nMax, topExponent, bottomExponent } = frame;
  return {
    x: {
      field: "n",
      type: "quantitative",
      scale: { type: "log", base: 2, domain: [nMin, nMax], nice: false },
      axis: {
        values: nodeTicks(frame),
        labelExpr: labelOnly(labelledTicks(nodeTicks(frame), frame.width)),
        labelPadding: 10,
        ticks: true,
        tickSize: 6,
        tickColor: "var(--rule)",
        labelOverlap: false,
        title: titles.x,
        titleAnchor: "start",
        titleAlign: "left",
        titleX: 0,
        titleY: 46,
        titleBaseline: "bottom",
        titleFont: labelFont,
      },
    },
    y: {
      field: "error",
      type: "quantitative",
      scale: {
        type: "log",
        domain: [10 ** bottomExponent, 10 ** topExponent],
        nice: false,
        clamp: true,
      },
      axis: {
        values: decades(frame),
        labelExpr: labelOnly(labelledDecades(frame), errorLabel),
        labelPadding: -staff.left + 7,
        labelOverlap: false,
        title: titles.y,
        titleAngle: 0,
        titleAnchor: "end",
        titleAlign: "left",
        titleBaseline: "bottom",
        titleX: -56,
        titleY: -12,
      },
    },
  };
}

const errorLabel = "datum.value == 1 ? '1' : replace(format(datum.value, '.0e'), '+', '')";

/** Only some of the grid lines are named. */
function labelOnly(named: readonly number[], text = "format(datum.value, 'd')"): string {
  const tests = named.map((value) => `abs(datum.value / ${value} - 1) < 1e-6`);
  return tests.length === 0 ? "''" : `(${tests.join(" || ")}) ? (${text}) : ''`;
}

function decades({ topExponent, bottomExponent }: ChartFrame): number[] {
  return Array.from({ length: topExponent - bottomExponent + 1 }, (_, k) => 10 ** (topExponent - k));
}

function labelledDecades(frame: ChartFrame): number[] {
  const decadeHeight = frame.height / (frame.topExponent - frame.bottomExponent);
  const every = [1, 2, 3, 4].find((step) => step * decadeHeight >= 58) ?? 5;
  return decades(frame).filter((value) => Math.round(Math.log10(value)) % every === 0);
}

/** Finer lines of the paper, and the levelling staff along the error axis. */
export function paperLayers(frame: ChartFrame): Layer[] {
  const fine = { strokeWidth: 1, stroke: "var(--grid-minor)" };
  return [
    {
      data: { values: fineNodes(frame).map((n) => ({ n })) },
      mark: { type: "rule", ...fine },
      encoding: { y: { value: 0 }, y2: { value: frame.height } },
    },
    {
      data: { values: fineErrors(frame).map((error) => ({ error })) },
      mark: { type: "rule", ...fine },
      encoding: { x: { value: 0 }, x2: { value: frame.width } },
    },
    {
      data: { values: [{}] },
      mark: { type: "rect", fill: "transparent", stroke: "var(--rule)", strokeWidth: 1 },
      encoding: { x: { value: 0 }, x2: { value: frame.width }, y: { value: 0 }, y2: { value: frame.height } },
    },
    ...staffLayers(frame),
  ];
}

function fineNodes(frame: ChartFrame): number[] {
  const { nMin, nMax } = frame;
  return [nMin / 2, ...nodeTicks(frame)]
    .flatMap((n) => [1.25, 1.5, 1.75].map((part) => n * part))
    .filter((n) => n > nMin && n < nMax);
}

function fineErrors(frame: ChartFrame): number[] {
  const isTooFine = frame.height / (frame.topExponent - frame.bottomExponent) < 20;
  if (isTooFine) return [];
  return decades(frame)
    .slice(1)
    .flatMap((decade) => [2, 3, 5].map((part) => part * decade));
}

/** Alternate decades are filled left and right. */
function staffLayers(frame: ChartFrame): Layer[] {
  const middle = (staff.left + staff.right) / 2;
  const filled = decades(frame)
    .slice(0, -1)
    .map((decade, index) => ({
      from: frame.height * errorShare(frame, decade),
      to: frame.height * errorShare(frame, decade / 10),
      left: index % 2 === 0 ? staff.left : middle,
      right: index % 2 === 0 ? middle : staff.right,
    }));
  return [
    {
      data: { values: [{}] },
      mark: { type: "rect", fill: "var(--sheet)", stroke: "var(--rule)", strokeWidth: 1 },
      encoding: {
        x: { value: staff.left },
        x2: { value: staff.right },
        y: { value: 0 },
        y2: { value: frame.height },
      },
    },
    {
      data: { values: filled },
      mark: { type: "rect", fill: "var(--ink)" },
      encoding: {
        x: { field: "left", type: "quantitative", scale: null, axis: null },
        x2: { field: "right" },
        y: { field: "from", type: "quantitative", scale: null, axis: null },
        y2: { field: "to" },
      },
    },
  ];
}
