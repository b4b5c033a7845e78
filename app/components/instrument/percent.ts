/** A share as a length for style sheets and SVG; rounded, since logarithms differ in their last bit between engines. */
export function percentOf(share: number): string {
  return `${(100 * share).toFixed(2)}%`;
}
