import { comparisonPlot } from "#app/components/comparison/comparison-plot.ts";
import { ComparisonFrame } from "#app/components/comparison/ComparisonFrame.tsx";
import { STACKS } from "#app/lib/comparison/kinds.ts";
import type { StackComparisonView } from "#app/schemas/stack-comparison.ts";
import { Compared } from "./Compared.tsx";

/** Stacks side by side: which, over what, and everything that differs. */
export function ComparePage({ view }: { view: StackComparisonView }) {
  const { compared } = view;
  return (
    <ComparisonFrame kind={STACKS} view={view} plot={compared && comparisonPlot(compared.chart)}>
      {compared ? <Compared view={view} compared={compared} /> : null}
    </ComparisonFrame>
  );
}
