import { getFormProps, getTextareaProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { bowText } from "#app/lib/lot-words.ts";
import type { StepMeasurements } from "#app/schemas/step-measurement.ts";

type Values = {
  step: string;
  summary: string;
  lot: string;
  wafers: string;
  uncertainty: string;
  measuredAt: string;
  instrument: string;
  sideUp: string;
  gravity: string;
};

interface Props {
  page: StepMeasurements;
  lastResult: SubmissionResult<string[]> | null;
}

const SIDES = [
  { value: "device", label: "Device side up" },
  { value: "back", label: "Back side up" },
];
const WEIGHT = [
  { value: "compensated", label: "Taken out" },
  { value: "included", label: "Still in it" },
];

/** Records bows after a step: a lot's summary, or a list by slot. */
export function MeasuredForm({ page: { steps, summaries, assessment }, lastResult }: Props) {
  const [form, fields] = useRecordForm<Values>({
    id: "measured",
    lastResult,
    defaultValue: { lot: assessment.lot ?? "" },
  });
  const known = summaries.some((summary) => summary.known);
  return (
    <Form
      method="post"
      {...getFormProps(form)}
      aria-labelledby="record"
      className="frame screen-only mt-6 max-w-260 p-4 tablet:p-6"
    >
      <h2 id="record" className="mb-3 text-lead font-medium">
        Record bows
      </h2>
      <FormHead lastResult={lastResult} />
      <div className="grid gap-3 tablet:grid-cols-2">
        <ChoiceField
          field={fields.step}
          label="Measured after"
          choices={steps.map(({ step, title, predicted }) => ({
            value: String(step),
            label: `Step ${step}, ${title}${predicted ? `: ${bowText(predicted.bow)}` : ""}`,
          }))}
          blank="Choose the step"
          hint="With the bow that is predicted there, at 25&nbsp;°C"
        />
        {summaries.length > 0 && (
          <ChoiceField
            field={fields.summary}
            label="Summary of a lot"
            choices={summaries.map(({ value, lot, wafers, measuredOn }) => ({
              value,
              label: `${lot}, ${wafers} ${wafers === 1 ? "wafer" : "wafers"}, ${measuredOn}`,
            }))}
            blank="None: list the wafers below"
            hint="Imported summaries of this program that have bows"
          />
        )}
      </div>
      <div className="mt-3 grid gap-3 tablet:grid-cols-2">
        <WaferList field={fields.wafers} />
        <div className="grid content-start gap-3 tablet:grid-cols-2">
          <LineField field={fields.lot} label="Lot" hint="As it stands on its box" input={{ autoComplete: "off" }} />
          <LineField
            field={fields.measuredAt}
            label="Measured on"
            hint={summaries.length > 0 ? "Blank: the day of the summary" : "2026-11-20"}
            input={{ placeholder: "year-month-day", autoComplete: "off" }}
          />
          <LineField
            field={fields.instrument}
            label="Instrument"
            hint="Blank: not named"
            input={{ autoComplete: "off" }}
          />
          <QuantityField
            field={fields.uncertainty}
            label="± of a bow, k = 2"
            dimension="length"
            example="2 µm"
            hint="Blank: 2&nbsp;µm half-width is taken"
          />
          <ChoiceField
            field={fields.sideUp}
            label="Measured"
            choices={SIDES}
            blank={known ? "As the summary says" : "Choose"}
            hint="Centre above is positive"
          />
          <ChoiceField
            field={fields.gravity}
            label="Weight of the wafer"
            choices={WEIGHT}
            blank={known ? "As the summary says" : "Choose"}
            hint="Predicted without it"
          />
        </div>
      </div>
      <div className="mt-3">
        <SubmitButton busy="Recording">Record</SubmitButton>
      </div>
    </Form>
  );
}

type Fields = ReturnType<typeof useRecordForm<Values>>[1];

function WaferList({ field }: { field: Fields["wafers"] }) {
  const faults = field.errors ?? [];
  return (
    <div className="field">
      <label htmlFor={field.id}>Wafers one by one</label>
      <textarea
        {...getTextareaProps(field)}
        key={field.key}
        rows={8}
        spellCheck={false}
        placeholder={"slot, bow\n1, -176\n2, -183"}
        aria-describedby={field.errorId}
        className="tabular-nums"
      />
      <small id={field.errorId}>
        {faults.length > 0
          ? faults.map((fault) => (
              <span key={fault} className="block">
                {fault}
              </span>
            ))
          : "Slot and bow, a line each; µm unless a unit stands beside it. With a decimal comma, semicolons between."}
      </small>
    </div>
  );
}
