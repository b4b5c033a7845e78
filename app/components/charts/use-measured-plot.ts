import { useCallback, useEffect, useRef, useState } from "react";
import type { ChartSize } from "./convergence-spec";
import { sizes } from "./drawings";

/** From here on names stand beside the curves; the same width as in the style sheet. */
const wideFrom = "(min-width: 760px)";

/** Follows the width that the page gives the plot, from when it first comes near the window. */
export function useMeasuredPlot(layout: keyof typeof sizes) {
  const place = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState<ChartSize | null>(null);
  const [isDrawn, setDrawn] = useState(false);
  useEffect(() => {
    const element = place.current;
    if (!element) return;
    const measure = () => {
      const kind = matchMedia(wideFrom).matches ? "wide" : "narrow";
      const width = Math.floor(element.clientWidth);
      if (width === 0) return;
      const next = { ...sizes[layout][kind], width };
      setSize((now) => (now && now.width === next.width && now.right === next.right ? now : next));
    };
    const resize = new ResizeObserver(measure);
    const approach = new IntersectionObserver(
      (entries) => {
        if (!entries.some((entry) => entry.isIntersecting)) return;
        approach.disconnect();
        resize.observe(element);
      },
      { rootMargin: "200px" },
    );
    approach.observe(element);
    return () => {
      approach.disconnect();
      resize.disconnect();
    };
  }, [layout]);
  return { place, size, isDrawn, onDrawn: useCallback(() => setDrawn(true), []) };
}
