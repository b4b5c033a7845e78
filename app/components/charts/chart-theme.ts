import { methodFamilies } from "@/drizzle/enums";
import { familySigns } from "@/app/components/ui/family-signs";

const signs = methodFamilies.map((family) => familySigns[family]);
const domain = [...methodFamilies];

/** Scales from a family to its three signs; colours are variables of the page, so that both themes work. */
export const familyScales = {
  colour: { domain, range: signs.map((sign) => sign.colour) },
  dash: { domain, range: signs.map((sign) => (sign.dash.length > 0 ? sign.dash : [1, 0])) },
  shape: { domain, range: signs.map((sign) => sign.path) },
  fill: {
    domain,
    range: methodFamilies.map((family) =>
      family === "finiteElement"
        ? "transparent"
        : familySigns[family].isOpen
          ? "var(--sheet)"
          : familySigns[family].colour,
    ),
  },
  outline: { domain, range: signs.map((sign) => (sign.isOpen ? sign.colour : "var(--sheet)")) },
  outlineWidth: {
    domain,
    range: methodFamilies.map((family) =>
      family === "finiteElement" ? 2 : familySigns[family].isOpen ? 1.4 : 0.8,
    ),
  },
  dot: { domain, range: signs.map((sign) => (sign.isOpen ? sign.colour : "var(--sheet)")) },
};

export const familiesWithDots = methodFamilies.filter((family) => familySigns[family].hasDot);

export const figureFont = "var(--f-figure)";
export const labelFont = "var(--f-label)";
export const displayFont = "var(--f-display)";

/** For every chart: no default of Vega's is to be seen. */
export const chartConfig = {
  aria: false,
  background: "transparent",
  view: { fill: "var(--sheet)", stroke: "transparent" },
  axis: {
    domain: false,
    ticks: false,
    grid: true,
    gridColor: "var(--grid-major)",
    gridWidth: 1,
    labelColor: "var(--ink-2)",
    labelFont: figureFont,
    labelFontSize: 12,
    labelFontWeight: 500 as const,
    titleColor: "var(--ink-2)",
    titleFont: labelFont,
    titleFontSize: 13,
    titleFontWeight: 500 as const,
  },
};
