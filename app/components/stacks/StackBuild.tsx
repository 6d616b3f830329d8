import type { FormMetadata } from "@conform-to/react";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import type { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { StackChoices, StackDraft } from "#app/lib/stack-draft.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import type { StackText } from "#app/lib/stack-text.ts";
import { insertion, LayerList } from "./LayerList.tsx";
import { SourceFields } from "./SourceFields.tsx";
import type { CutPartOf } from "./stack-cut-layers.ts";
import { StackCut } from "./StackCut.tsx";
import { fieldId } from "./stack-fields.ts";
import { headStamp, StackHeadFields } from "./StackHeadFields.tsx";
import { StackToolBar, type StackToolBarProps } from "./StackToolBar.tsx";
import type { LayerEdits } from "./use-layer-edits.ts";

interface Props {
  form: FormMetadata<StackText>;
  fields: ReturnType<typeof useRecordForm<StackText>>[1];
  programs: readonly { id: string; name: string }[] | null;
  choices: StackChoices;
  draft: StackDraft;
  /** the same, as the drawings have it: they may be a key behind */
  drawn: StackDraft;
  panel: StackPanel | null;
  limits: SiteLimits;
  part: CutPartOf;
  focusPart: (part: CutPartOf) => void;
  edits: LayerEdits;
  /** false without scripts, which all of it needs */
  bar: false | Omit<StackToolBarProps, "onMirror">;
}

/** The left pane: what is built, the cut with the fields of its films beside it. */
export function StackBuild(props: Props) {
  const { form, fields, programs, choices, draft, drawn, panel, limits, part, focusPart, edits, bar } = props;
  return (
    <>
      {bar ? (
        <StackToolBar {...bar} onMirror={draft.layers.some(({ side }) => side === "front") ? edits.mirrorAll : null} />
      ) : (
        // Keeps its place until the scripts are there.
        <div className="min-h-16 border-b border-line scriptless:hidden" />
      )}
      <StackHeadFields
        fields={fields}
        programs={programs}
        silicon={choices.silicon}
        draft={draft}
        stamp={headStamp(fields, draft)}
      />
      <div className="@container border-b border-line">
        <div className="grid grid-cols-[minmax(0,1fr)] @min-[700px]:grid-cols-[464px_minmax(0,1fr)]">
          <div className="p-4 tablet:px-0">
            <StackCut
              draft={drawn}
              panel={panel}
              limits={limits}
              edit={{
                selected: part,
                hrefFor: (of) => (of === "silicon" ? `#${fieldId("siliconThickness.value")}` : `#layer-${of}`),
                onSelect: (of) => {
                  edits.select(of);
                  if (of === "silicon") focusPart(of);
                },
                onAdd: (side) => form.insert(insertion(fields.layers.name, side, draft.layers.length)),
                onShift: edits.shift,
                onPlace: edits.place,
              }}
            />
          </div>
          <div className="border-line @max-[700px]:border-t @min-[700px]:border-l">
            <LayerList
              form={form}
              field={fields.layers}
              draft={draft}
              films={choices.films}
              selected={part === "silicon" ? null : part}
              edits={edits}
            />
          </div>
        </div>
      </div>
      <details className="px-4 py-3 tablet:px-5" open={fields.note.errors ? true : undefined}>
        <summary className="link w-fit cursor-pointer text-label">Note, and source of the silicon thickness</summary>
        <div className="mt-2 grid gap-3 tablet:grid-cols-2">
          <SourceFields parts={fields.siliconThickness.getFieldset()} of="silicon thickness" />
          <div className="col-span-full">
            <NoteField field={fields.note} label="Note" />
          </div>
        </div>
      </details>
    </>
  );
}
