import { lazy, memo, Suspense, useMemo, type ReactNode } from "react";
import { OnceNear } from "#app/components/ui/OnceNear.tsx";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ChartOthers } from "#app/lib/stack-chart.ts";
import type { StackDraft } from "#app/lib/stack-draft.ts";
import { turnFront } from "#app/lib/stack-order.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import { AssumedInputs } from "./AssumedInputs.tsx";
import { BowModels } from "./BowModels.tsx";
import { FilmForces } from "./FilmForces.tsx";
import { StackChart } from "./StackChart.tsx";
import { StackWorkings } from "./StackWorkings.tsx";

// Only scripts draw wafers, for who scrolls that far.
const WarpSpread = lazy(() => import("./WarpSpread.tsx").then((module) => ({ default: module.WarpSpread })));

interface Props {
  name: string;
  draft: StackDraft;
  panel: StackPanel | null;
  overlay: ChartOthers["overlay"];
  limits: SiteLimits;
  options: ReactNode;
}

/** What follows from the stack besides the answer: the curve, the models side by side, what is assumed, the calculations. */
export const StackFindings = memo(function StackFindings(props: Props) {
  const { name, draft, panel, overlay, limits, options } = props;
  const names = useMemo(() => turnFront(draft.layers).map((layer) => layer.name), [draft]);
  if (!panel) return <div className="border-t border-line px-4 py-4 tablet:px-6">{options}</div>;
  return (
    <>
      <StackChart name={name} panel={panel} overlay={overlay} limits={limits} options={options} />
      <FilmForces estimated={panel.room} names={names} />
      <BowModels estimated={panel.room} />
      <section className="border-t border-line px-4 py-3 tablet:px-6 scriptless:hidden" aria-labelledby="spread">
        <h3 id="spread" className="font-semibold">
          Wafers beyond a warp
        </h3>
        <OnceNear className="min-h-20">
          <Suspense>
            <WarpSpread estimated={panel.room} />
          </Suspense>
        </OnceNear>
      </section>
      <AssumedInputs draft={draft} />
      <StackWorkings estimated={panel.room} names={names} />
    </>
  );
});
