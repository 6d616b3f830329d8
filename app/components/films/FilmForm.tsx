import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { FILM_PROPERTIES as P } from "./film-properties.ts";

type FilmFormValues = { name: string; kind: string; note: string; stressState: string } & Record<
  keyof typeof P,
  MeasuredText
>;

/** A film with all its properties, each with tolerance and source. */
export function FilmForm({ record, ...rest }: RecordFormProps<LibraryRecords["film"]>) {
  const [form, fields] = useRecordForm<FilmFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? { ...record, ...measuredTexts(record, P) } : {},
  });
  return (
    <RecordForm form={form} what="film" {...rest}>
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField field={fields.name} label="Name" />
        <ChoiceField field={fields.kind} label="Kind" choices={sameWords(FILM_KINDS)} blank="Choose" />
      </div>
      <PropertyField field={fields.stress} of={P.stress} />
      <LineField
        field={fields.stressState}
        label="State of the film when that stress was measured"
        hint="As deposited, after cure, after the hottest step …"
      />
      <PropertyField field={fields.youngsModulus} of={P.youngsModulus} />
      <PropertyField field={fields.poissonsRatio} of={P.poissonsRatio} />
      <PropertyField field={fields.expansion} of={P.expansion} />
      <PropertyField field={fields.yieldStress} of={P.yieldStress} />
      <PropertyField field={fields.temperatureLimit} of={P.temperatureLimit} />
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
