/** The names of findings as they stand in lists; a code without one is shown as it is, hyphens as spaces. */
const names: Record<string, string> = {
  "axes-refined-apart": "axes refined apart",
  "coordinates-off": "coordinates off",
  "cost-falls": "cost falls on a finer grid",
  "descending-order": "descending order",
  "end-node-included": "end node included",
  "end-node-repeated": "end node repeated",
  "equals-exact": "equals the exact solution",
  "error-not-falling": "error not falling",
  "few-digits": "few digits",
  "fewer-than-three-grids": "fewer than three grids",
  "non-spatial-error": "non-spatial error",
  "order-above-formal": "order above formal",
  "order-below-formal": "order below formal",
  "same-file-elsewhere": "same file elsewhere",
  "small-refinement-ratio": "small refinement ratio",
  "wide-gap": "wide gap",
  "wrong-time": "wrong time",
};

export function findingName(code: string): string {
  return names[code] ?? code.replaceAll("-", " ");
}
