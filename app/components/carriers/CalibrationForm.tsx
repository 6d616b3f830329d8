import { getFormProps, type FieldMetadata, type SubmissionResult } from "@conform-to/react";
import { useRef, type ReactNode } from "react";
import { Form } from "react-router";
import { ChoiceField, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { FITS, type CalibrationFlow } from "#app/lib/calibration-view.ts";

type BowRow = { step: string; bow: string; uncertainty: string };
type CalibrationFormValues = { flow: string; fit: string; rows: BowRow[] };

const BLANK: BowRow = { step: "", bow: "", uncertainty: "" };

interface Props {
  flow: CalibrationFlow;
  lastResult: SubmissionResult<string[]> | null | undefined;
}

/** Measured bows of pairs, and what is to be fitted to them. Three blank rows stand there from the start, for work without scripts. */
export function CalibrationForm({ flow, lastResult }: Props) {
  const [form, fields] = useRecordForm<CalibrationFormValues>({
    lastResult,
    defaultValue: { fit: flow.fits[0], rows: [BLANK, BLANK, BLANK] },
  });
  const add = useRef<HTMLButtonElement>(null);
  // A post that is not from this form may have sent something else under the name of the list.
  const rows = Array.isArray(fields.rows.initialValue) ? fields.rows.getFieldList() : [];
  const steps = flow.steps.map(({ number, title, bow }) => ({
    value: String(number),
    label: `${number}, ${title}; computed ${bow}`,
  }));
  return (
    <Form method="post" preventScrollReset {...getFormProps(form)} className="frame max-w-240 space-y-4 p-4 tablet:p-6">
      <FormHead lastResult={lastResult} />
      <input type="hidden" name="flow" value={flow.id} />
      <section aria-labelledby="bows">
        <h2 id="bows" className="font-semibold">
          Measured bows of the pair
        </h2>
        <p className="max-w-[60em] text-quiet">
          Standard bow at 25&nbsp;°C, device side up, dome positive, gravity compensated: what the profilometer reports.
          A pair that lies back side up shows the other sign. Rows that stay blank are passed over.
        </p>
        {fields.rows.errors && <p className="text-label text-stop">{fields.rows.errors[0]}</p>}
        {rows.map((row, index) => (
          <BowLine key={row.key} row={row} number={index + 1} steps={steps}>
            <button
              {...form.remove.getButtonProps({ name: fields.rows.name, index })}
              className="btn btn-remove"
              aria-label={`Take row ${index + 1} out`}
              onClick={() => add.current?.focus()}
            >
              Take out
            </button>
          </BowLine>
        ))}
        <button
          ref={add}
          {...form.insert.getButtonProps({ name: fields.rows.name, defaultValue: BLANK })}
          className="btn mt-3"
        >
          Another bow
        </button>
      </section>
      <ChoiceField
        field={fields.fit}
        label="Fit"
        choices={flow.fits.map((fit) => ({ value: fit, label: FITS[fit].label }))}
        hint="Everything else of the flow is taken as exact"
        className="max-w-120"
      />
      <div className="border-t border-line pt-4">
        <SubmitButton busy="Calibrating">Calibrate</SubmitButton>
        <p className="mt-2 text-quiet">Nothing is stored by it.</p>
      </div>
    </Form>
  );
}

interface LineProps {
  row: FieldMetadata<BowRow>;
  number: number;
  steps: Choice[];
  children: ReactNode;
}

function BowLine({ row, number, steps, children }: LineProps) {
  const parts = row.getFieldset();
  return (
    <fieldset className="mt-3 border-t border-line pt-3">
      <legend className="sr-only">Bow, row {number}</legend>
      <div className="grid gap-3 tablet:grid-cols-[minmax(0,1fr)_10rem_12rem_auto]">
        <ChoiceField field={parts.step} label="After step" choices={steps} blank="Choose" />
        <QuantityField field={parts.bow} label="Measured bow" dimension="length" example="-120 um" />
        <QuantityField
          field={parts.uncertainty}
          label="Standard uncertainty"
          dimension="length"
          example="3 um"
          hint="Of a mean, its own"
        />
        <div className="tablet:pt-5">{children}</div>
      </div>
    </fieldset>
  );
}
