import type { FieldMetadata } from "@conform-to/react";
import { memo } from "react";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { toleranceRule } from "#app/lib/read-quantity.ts";
import type { SiliconChoice, StackDraft } from "#app/lib/stack-draft.ts";
import { thicknessWords } from "#app/lib/stack-words.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { Remark } from "./Remark.tsx";

interface Props {
  fields: {
    program: FieldMetadata<string>;
    name: FieldMetadata<string>;
    silicon: FieldMetadata<string>;
    siliconThickness: FieldMetadata<MeasuredText>;
  };
  /** for a new stack only: a stack stays in its program */
  programs: readonly { id: string; name: string }[] | null;
  silicon: readonly SiliconChoice[];
  draft: StackDraft;
  /** the same while nothing of them has changed, their errors included */
  stamp: string;
}

/** Name, program and silicon: the top of the left pane. A key typed into a film leaves them as they are. */
export const StackHeadFields = memo(
  HeadFields,
  (before, after) =>
    before.stamp === after.stamp && before.programs === after.programs && before.silicon === after.silicon,
);

/** What the stamp of the head fields is made of. */
export const headStamp = ({ name, program, silicon, siliconThickness }: Props["fields"], draft: StackDraft): string =>
  JSON.stringify([
    [name, program, silicon, siliconThickness].map(({ key, value, allErrors }) => [key, value, allErrors]),
    draft.silicon,
    draft.remarks,
  ]);

function HeadFields({ fields, programs, silicon, draft }: Props) {
  const thickness = fields.siliconThickness.getFieldset();
  const bought = draft.silicon ? `As bought ${thicknessWords(draft.silicon.thickness)}` : undefined;
  return (
    <div className="grid grid-cols-2 gap-x-4 gap-y-2 border-b border-ink p-4 tablet:grid-cols-6 tablet:px-5">
      <LineField
        field={fields.name}
        label="Name"
        className={programs ? "col-span-2 tablet:col-span-4" : "col-span-2 tablet:col-span-6"}
      />
      {programs && (
        <ChoiceField
          field={fields.program}
          label="Program"
          className="col-span-2"
          choices={programs.map(({ id, name }) => ({ value: id, label: name }))}
          blank="Choose"
        />
      )}
      <ChoiceField
        field={fields.silicon}
        label="Silicon"
        className="col-span-2 tablet:col-span-3"
        choices={silicon.map(({ id, name }) => ({ value: id, label: name }))}
        blank="Choose"
      />
      <QuantityField
        field={thickness.value}
        label="Remaining silicon"
        className="tablet:col-span-2"
        dimension="length"
        rule={RULES.siliconThickness}
        example="100 µm"
        hint={bought}
      />
      <QuantityField
        field={thickness.tolerance}
        label="Tolerance, ±"
        dimension="length"
        rule={toleranceRule(RULES.siliconThickness)}
        example="3 µm"
      />
      {draft.remarks.map((remark) => (
        <div key={remark} className="col-span-full">
          <Remark>{remark}</Remark>
        </div>
      ))}
    </div>
  );
}
