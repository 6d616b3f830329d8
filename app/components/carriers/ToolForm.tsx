import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { TOOL_PROPERTIES as P } from "./tool-properties.ts";

type ToolFormValues = { name: string; holding: string; atPeak: string; note: string } & Record<
  keyof typeof P,
  MeasuredText
>;

const AT_PEAK = [
  { value: "free", label: "Free: boat, pins or belt" },
  { value: "held", label: "Held: vacuum, clamp or frame" },
];

/** A tool with the warp that it takes. */
export function ToolForm({ record, ...rest }: RecordFormProps<LibraryRecords["equipment"]>) {
  const [form, fields] = useRecordForm<ToolFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? { ...record, ...measuredTexts(record, P) } : {},
  });
  return (
    <RecordForm form={form} what="tool" {...rest}>
      <LineField field={fields.name} label="Name" />
      <div className="grid gap-3 tablet:grid-cols-2">
        <LineField
          field={fields.holding}
          label="How it holds the wafer"
          hint="Vacuum, clamped, edge grip, free in boat …"
        />
        <ChoiceField field={fields.atPeak} label="The wafer when it is hot" choices={AT_PEAK} blank="Choose" />
      </div>
      <PropertyField field={fields.warpLimitEdgesUp} of={P.warpLimitEdgesUp} />
      <PropertyField field={fields.warpLimitEdgesDown} of={P.warpLimitEdgesDown} />
      <PropertyField field={fields.leastUnsupportedThickness} of={P.leastUnsupportedThickness} />
      <PropertyField field={fields.largestDiameter} of={P.largestDiameter} />
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
