import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { OptionalFields } from "#app/components/library/OptionalFields.tsx";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { quantityText } from "#app/lib/form-values.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { FILM_HANDLING_PROPERTIES as H, FILM_PROPERTIES as P } from "./film-properties.ts";

type Film = LibraryRecords["film"];

type FilmFormValues = {
  name: string;
  kind: string;
  note: string;
  stressState: string;
  handling: Record<Exclude<keyof Film["handling"], keyof typeof H>, string> & Record<keyof typeof H, MeasuredText>;
} & Record<keyof typeof P, MeasuredText>;

const formValues = (film: Film) => {
  const { stressState, stressFilmThickness, monitorThickness, monitorDiameter } = film.handling;
  return {
    ...film,
    ...measuredTexts(film, P),
    handling: {
      ...measuredTexts(film.handling, H),
      stressState: stressState ?? "",
      stressFilmThickness: quantityText(stressFilmThickness, "length", "µm"),
      monitorThickness: quantityText(monitorThickness, "length", "µm"),
      monitorDiameter: quantityText(monitorDiameter, "length", "mm"),
    },
  };
};

/** A film with all its properties, each with tolerance and source. */
export function FilmForm({ record, ...rest }: RecordFormProps<Film>) {
  const [form, fields] = useRecordForm<FilmFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  const handling = fields.handling.getFieldset();
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
      <PropertyField field={fields.zeroStressTemperature} of={P.zeroStressTemperature} />
      <PropertyField field={fields.temperatureLimit} of={P.temperatureLimit} />
      <OptionalFields
        label="What its stress was measured on, and its solder"
        holds={["handling"]}
        given={record !== null && Object.values(record.handling).some((value) => value !== null)}
        lastResult={rest.lastResult}
      >
        <div className="grid gap-3 tablet:grid-cols-4">
          <ChoiceField
            field={handling.stressState}
            label="Stress measured"
            choices={sameWords(["as deposited", "after heating"])}
            blank="Not given"
            hint="Heat on top is computed"
          />
          <QuantityField
            field={handling.stressFilmThickness}
            label="Film thickness then"
            dimension="length"
            example="5 µm"
            hint="Stress changes with it"
          />
          <QuantityField
            field={handling.monitorThickness}
            label="Monitor thickness"
            dimension="length"
            example="725 µm"
          />
          <QuantityField
            field={handling.monitorDiameter}
            label="Monitor diameter"
            dimension="length"
            example="200 mm"
          />
        </div>
        <PropertyField field={handling.solderMelting} of={H.solderMelting} />
      </OptionalFields>
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
