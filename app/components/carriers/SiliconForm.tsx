import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { quantityText } from "#app/lib/form-values.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { FACES, SILICON_PROPERTIES as P } from "./silicon-properties.ts";

type Silicon = LibraryRecords["silicon"];

type SiliconFormValues = { name: string; orientation: string; diameter: string; note: string } & Record<
  keyof typeof P,
  MeasuredText
>;

const formValues = (silicon: Silicon) => ({
  ...silicon,
  ...measuredTexts(silicon, P),
  diameter: quantityText(silicon.diameter, "length", "mm"),
});

const CHOICES = Object.entries(FACES).map(([value, label]) => ({ value, label }));

/** A kind of wafer as it is bought. */
export function SiliconForm({ record, ...rest }: RecordFormProps<Silicon>) {
  const [form, fields] = useRecordForm<SiliconFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  return (
    <RecordForm form={form} what="silicon wafer" {...rest}>
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr_1fr]">
        <LineField field={fields.name} label="Name" />
        <ChoiceField
          field={fields.orientation}
          label="Face"
          choices={CHOICES}
          blank="Choose"
          hint="Its elastic data follow from it"
        />
        <QuantityField field={fields.diameter} label="Diameter" dimension="length" example="300 mm" />
      </div>
      <PropertyField field={fields.thickness} of={P.thickness} />
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
