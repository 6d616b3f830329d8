import type { FormMetadata } from "@conform-to/react";
import { memo } from "react";
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
import type { LayerEdits } from "./use-layer-edits.ts";

interface Props {
  form: FormMetadata<StackText>;
  fields: ReturnType<typeof useRecordForm<StackText>>[1];
  /** the same while no field has come, gone, been written or been found wrong; what is typed is in `draft` */
  stamp: string;
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
}

/**
 * The left pane: what is built, the cut with the fields of its films beside it. The proxies of the form's library are others with every
 * key, so what they hold is told by `stamp` and `draft`.
 */
export const StackBuild = memo(
  Build,
  (before, after) =>
    before.stamp === after.stamp &&
    before.programs === after.programs &&
    before.choices === after.choices &&
    before.draft === after.draft &&
    before.drawn === after.drawn &&
    before.panel === after.panel &&
    before.limits === after.limits &&
    before.part === after.part,
);

function Build(props: Props) {
  const { form, fields, programs, choices, draft, drawn, panel, limits, part, focusPart, edits } = props;
  return (
    <>
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
