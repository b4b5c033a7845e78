import { useMemo } from "react";
import { VegaEmbed } from "react-vega";
import type { TopLevelSpec } from "vega-lite";
import { expressionInterpreter } from "vega-interpreter";

interface VegaChartProps {
  spec: TopLevelSpec;
  onDrawn: () => void;
}

/** The lazy part: Vega itself. Expressions are interpreted, since the policy of the pages forbids evaluation. */
export default function VegaChart({ spec, onDrawn }: VegaChartProps) {
  const options = useMemo(
    () => ({
      mode: "vega-lite" as const,
      renderer: "svg" as const,
      actions: false,
      ast: true,
      expr: expressionInterpreter,
      defaultStyle: false,
      tooltip: { disableDefaultStyle: true },
    }),
    [],
  );
  return <VegaEmbed spec={spec} options={options} onEmbed={onDrawn} />;
}
