import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form, Link } from "react-router";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { formatWithUncertainty } from "#app/engine/units/format.ts";
import type { ReferenceWaferView } from "#app/schemas/instrument.ts";

type ReferenceFormValues = {
  wafer: string;
  newName: string;
  knownBow: string;
  knownUncertainty: string;
  diameter: string;
  certificate: string;
  measuredOn: string;
  bow: string;
  note: string;
};

interface Props {
  wafers: ReferenceWaferView[];
  today: string;
  lastResult: SubmissionResult<string[]> | null | undefined;
  back: string;
}

/** A reading of a wafer of known bow: of one that is known here, or of a new one with its certificate. */
export function ReferenceForm({ wafers, today, lastResult, back }: Props) {
  const [form, fields] = useRecordForm<ReferenceFormValues>({
    lastResult,
    defaultValue: { measuredOn: today, wafer: wafers.length === 1 ? wafers[0]?.id : "" },
  });
  const choices = wafers.map(({ id, name, bow, bowUncertainty, diameter }) => ({
    value: id,
    label: `${name}: ${formatWithUncertainty(bow, 2 * bowUncertainty, "length", { unit: "µm", sign: true })}, ${Math.round(diameter * 1000)} mm`,
  }));
  return (
    <Form method="post" {...getFormProps(form)} className="frame max-w-240">
      <div className="p-4 empty:hidden tablet:px-6">
        <FormHead lastResult={lastResult} />
      </div>
      <fieldset className="min-w-0 p-4 tablet:p-6">
        <legend className="float-left mb-3 w-full font-semibold">The reading</legend>
        <div className="clear-both grid gap-x-3 gap-y-2 tablet:grid-cols-2">
          {wafers.length > 0 && (
            <ChoiceField
              field={fields.wafer}
              label="Wafer of known bow"
              choices={choices}
              blank="A new one, named below"
              className="tablet:col-span-2"
            />
          )}
          <QuantityField
            field={fields.bow}
            label="Bow as read"
            dimension="length"
            example="-45.2 µm"
            hint="Standard bow, device side up: a bowl is negative"
          />
          <LineField
            field={fields.measuredOn}
            label="Measured on"
            input={{ placeholder: "year-month-day", autoComplete: "off" }}
          />
          <LineField field={fields.note} label="Note" className="tablet:col-span-2" />
        </div>
      </fieldset>
      <fieldset className="min-w-0 border-t border-ink p-4 tablet:p-6">
        <legend className="float-left mb-1 w-full font-semibold">A wafer that is new here</legend>
        <p className="clear-both mb-3 text-quiet">
          As its certificate has it. {wafers.length > 0 && "Leave these blank for a wafer that is chosen above."}
        </p>
        <div className="grid gap-x-3 gap-y-2 tablet:grid-cols-2">
          <LineField
            field={fields.newName}
            label="Name"
            hint="With the year of its certificate, for example R-07 of 2026"
          />
          <QuantityField field={fields.diameter} label="Diameter" dimension="length" example="200 mm" />
          <QuantityField field={fields.knownBow} label="Known bow" dimension="length" example="-45.0 µm" />
          <QuantityField
            field={fields.knownUncertainty}
            label="Its uncertainty, k = 2"
            dimension="length"
            example="0.4 µm"
          />
          <LineField
            field={fields.certificate}
            label="Certificate"
            hint="Number, who measured it"
            className="tablet:col-span-2"
          />
        </div>
      </fieldset>
      <div className="flex flex-wrap gap-2 border-t border-ink p-4 tablet:px-6">
        <SubmitButton busy="Keeping it">Keep the reading</SubmitButton>
        <Link to={back} className="btn">
          Leave without saving
        </Link>
      </div>
    </Form>
  );
}
