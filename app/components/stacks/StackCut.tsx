import { memo } from "react";
import { Cut } from "#app/components/drawings/Cut.tsx";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import type { StackDraft } from "#app/lib/stack-draft.ts";
import { shapeWords } from "#app/lib/stack-words.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { bowOf, exaggerationOf } from "./bow-of.ts";
import { stackCutLayers, type CutPartOf } from "./stack-cut-layers.ts";
import type { LayerEdits } from "./use-layer-edits.ts";

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
    onShift: LayerEdits["shift"];
    onPlace: LayerEdits["place"];
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
  // Above the silicon a film comes to lie on the device side, below it on the back.
  const place = ({ from, before }: { from: number; before: number }) => {
    const [film, silicon] = [partAt(from), layers.findIndex(({ part }) => part === "silicon")];
    if (film === "silicon") return;
    edit?.onPlace(film, before <= silicon ? { before, side: "front" } : { before: before - 1, side: "back" });
  };
  const shift = (index: number, by: 1 | -1) => {
    const film = partAt(index);
    return film !== "silicon" && edit !== undefined && edit.onShift(film, by);
  };
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
      onShift={edit && shift}
      onMove={edit && place}
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
    head: "Free at 25\u00A0°C",
    note: curled ? "curled about one axis, ×1" : `${shapeWords(shape, limits.flatWithin.value)}, ×${exaggeration}`,
    diameter,
    shape: bowOf(shape),
    deviceSideUp: true,
    holding: "bare" as const,
    exaggeration,
  };
}
