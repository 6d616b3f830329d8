import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form, Link } from "react-router";
import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { FilmFormValues } from "./film-form-values.ts";

interface Props {
  values: Partial<FilmFormValues>;
  version: number | null;
  lastResult: SubmissionResult<string[]> | null | undefined;
  back: string;
}

/** A film with all its properties, each with tolerance and source. */
export function FilmForm({ values, version, lastResult, back }: Props) {
  const [form, fields] = useRecordForm<FilmFormValues>({ lastResult, defaultValue: values });
  return (
    <Form method="post" {...getFormProps(form)} className="frame max-w-240 space-y-4 p-4 tablet:p-6">
      <FormHead lastResult={lastResult} />
      {version !== null && <input type="hidden" name="version" value={version} />}
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField field={fields.name} label="Name" />
        <ChoiceField field={fields.kind} label="Kind" choices={sameWords(FILM_KINDS)} blank="Choose" />
      </div>
      <MeasuredField
        field={fields.stress}
        label="Stress at 25 °C, held flat on a full-thickness monitor; tension is positive"
        dimension="stress"
        example="-120 MPa"
      />
      <LineField
        field={fields.stressState}
        label="State of the film when that stress was measured"
        hint="As deposited, after cure, after the hottest step …"
      />
      <MeasuredField field={fields.youngsModulus} label="Young’s modulus" dimension="stress" example="117 GPa" />
      <MeasuredField field={fields.poissonsRatio} label="Poisson’s ratio" dimension="number" example="0.34" />
      <MeasuredField field={fields.expansion} label="Thermal expansion" dimension="expansion" example="16.7 ppm/K" />
      <MeasuredField
        field={fields.yieldStress}
        label="Yield stress at 25 °C, for a metal that yields"
        dimension="stress"
        example="200 MPa"
        hint="Blank: it stays elastic"
      />
      <MeasuredField
        field={fields.temperatureLimit}
        label="Highest temperature it may see"
        dimension="temperature"
        toleranceDimension="temperatureDifference"
        example="350 °C"
      />
      <NoteField field={fields.note} label="Note" />
      <div className="flex flex-wrap gap-2 border-t border-line pt-4">
        <SubmitButton busy="Saving">Save film</SubmitButton>
        <Link to={back} className="btn">
          Leave without saving
        </Link>
      </div>
    </Form>
  );
}
