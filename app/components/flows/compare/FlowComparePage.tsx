import { ComparisonFrame } from "#app/components/comparison/ComparisonFrame.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { FLOWS } from "#app/lib/comparison/kinds.ts";
import type { FlowComparisonView } from "#app/schemas/flow-comparison.ts";
import { ComparedFlowsArticle } from "./ComparedFlowsArticle.tsx";
import { flowPlot } from "./flow-plot.ts";

/** Flows side by side: which, along what, and everything that differs. */
export function FlowComparePage({ view }: { view: FlowComparisonView }) {
  const { compared } = view;
  return (
    <ComparisonFrame kind={FLOWS} view={view} plot={compared && flowPlot(compared.drawn)}>
      {compared ? (
        <>
          {compared.notWalked.map(({ letter, name, reason }) => (
            <Notice key={letter} kind="caution" title={`${letter}, ${name}, cannot be walked`}>
              {reason} The others are compared.
            </Notice>
          ))}
          <ComparedFlowsArticle view={view} compared={compared} />
        </>
      ) : null}
    </ComparisonFrame>
  );
}
