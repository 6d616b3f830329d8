import { useMemo, type ReactNode } from "react";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ChartOthers } from "#app/lib/stack-chart.ts";
import type { StackDraft } from "#app/lib/stack-draft.ts";
import { turnFront } from "#app/lib/stack-order.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import { AssumedInputs } from "./AssumedInputs.tsx";
import { BowModels } from "./BowModels.tsx";
import { StackChart } from "./StackChart.tsx";
import { StackWorkings } from "./StackWorkings.tsx";
import { WarpSpread } from "./WarpSpread.tsx";

interface Props {
  name: string;
  draft: StackDraft;
  panel: StackPanel | null;
  overlay: ChartOthers["overlay"];
  limits: SiteLimits;
  options: ReactNode;
}

/** What follows from the stack besides the answer: the curve, the models side by side, what is assumed, the calculations. */
export function StackFindings({ name, draft, panel, overlay, limits, options }: Props) {
  const names = useMemo(() => turnFront(draft.layers).map((layer) => layer.name), [draft]);
  if (!panel) return <div className="border-t border-line px-4 py-4 tablet:px-6">{options}</div>;
  return (
    <>
      <StackChart name={name} panel={panel} overlay={overlay} limits={limits} options={options} />
      <BowModels estimated={panel.room} />
      <WarpSpread estimated={panel.room} />
      <AssumedInputs draft={draft} />
      <StackWorkings estimated={panel.room} names={names} />
    </>
  );
}
