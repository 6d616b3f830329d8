import { memo } from "react";
import { Cut } from "#app/components/drawings/Cut.tsx";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import type { StackDraft } from "#app/lib/stack-draft.ts";
import { shapeWords } from "#app/lib/stack-words.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { bowOf, exaggerationOf } from "./bow-of.ts";
import { stackCutLayers, type CutPartOf } from "./stack-cut-layers.ts";

interface Props {
  draft: StackDraft;
  panel: StackPanel | null;
  limits: SiteLimits;
  /** how it is edited; without it the cut is a drawing and no more */
  edit?: {
    selected: CutPartOf | null;
    hrefFor: (part: CutPartOf) => string;
    onSelect: (part: CutPartOf) => void;
    onAdd: (side: "front" | "back") => void;
  };
}

/**
 * The stack layer by layer as it is typed, with the shape that its free wafer takes. Drawn anew only when one of these changes; what
 * `edit` does depends on nothing else.
 */
export const StackCut = memo(
  CutDrawing,
  (before, after) =>
    before.draft === after.draft &&
    before.panel === after.panel &&
    before.limits === after.limits &&
    before.edit?.selected === after.edit?.selected,
);

function CutDrawing({ draft, panel, limits, edit }: Props) {
  const layers = stackCutLayers(draft, edit?.selected ?? null);
  const partAt = (index: number) => layers[index]?.part ?? "silicon";
  return (
    <Cut
      layers={layers.map(({ layer }) => layer)}
      label="The stack, layer by layer"
      top={{
        words: "Device side",
        add: edit && { words: "Add a film on top", href: "#device-side", onAdd: () => edit.onAdd("front") },
      }}
      bottom={{
        words: "Back side",
        add: edit && { words: "Add a film below", href: "#back-side", onAdd: () => edit.onAdd("back") },
      }}
      hrefFor={edit && ((index) => edit.hrefFor(partAt(index)))}
      onSelect={edit && ((index) => edit.onSelect(partAt(index)))}
      showKey
      shape={panel ? freeShape(panel, limits) : undefined}
    />
  );
}

/** The free wafer under the cut, at the largest scale that suits it. */
function freeShape({ room: { request, answer } }: StackPanel, limits: SiteLimits) {
  const { shape } = answer;
  const diameter = request.wafer.diameter_m;
  const exaggeration = exaggerationOf([{ shape, diameter }]);
  const curled = shape.regime === "curled";
  return {
    head: "Free at 25 °C",
    note: curled ? "curled about one axis, ×1" : `${shapeWords(shape, limits.flatWithin.value)}, ×${exaggeration}`,
    diameter,
    shape: bowOf(shape),
    deviceSideUp: true,
    holding: "bare" as const,
    exaggeration,
  };
}
