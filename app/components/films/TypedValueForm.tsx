import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";

type Values = {
  value: string;
  uncertainty: string;
  filmThickness: string;
  instrument: string;
  measuredAt: string;
  source: string;
  reason: string;
};

/** A stress that was measured elsewhere, taken into the history. */
export function TypedValueForm({
  version,
  lastResult,
}: {
  version: number;
  lastResult: SubmissionResult<string[]> | null;
}) {
  const [form, fields] = useRecordForm<Values>({ id: "typed-stress", lastResult });
  return (
    <details className="screen-only mt-6" open={lastResult !== null}>
      <summary className="link w-fit cursor-pointer">Add a value measured elsewhere</summary>
      <Form
        key={version}
        method="post"
        {...getFormProps(form)}
        aria-label="Add a value measured elsewhere"
        preventScrollReset
        className="frame mt-2 max-w-260 p-4 tablet:p-6"
      >
        <FormHead lastResult={lastResult} />
        <input type="hidden" name="version" value={version} />
        <div className="grid gap-3 tablet:grid-cols-4">
          <QuantityField
            field={fields.value}
            label="Stress"
            dimension="stress"
            example="31 MPa"
            hint="Tension positive, at 25&nbsp;°C"
          />
          <QuantityField
            field={fields.uncertainty}
            label="Its ±, k = 2"
            dimension="stress"
            example="1.5 MPa"
            hint="Expanded uncertainty"
          />
          <QuantityField
            field={fields.filmThickness}
            label="Film thickness"
            dimension="length"
            example="5 µm"
            hint="Blank: not known"
          />
          <LineField
            field={fields.measuredAt}
            label="Measured on"
            hint="2026-11-20"
            input={{ placeholder: "year-month-day", autoComplete: "off" }}
          />
        </div>
        <div className="mt-3 grid gap-3 tablet:grid-cols-3">
          <LineField
            field={fields.instrument}
            label="Instrument"
            hint="Blank: not named"
            input={{ autoComplete: "off" }}
          />
          <LineField field={fields.source} label="Where it comes from" hint="Report, tool, person" />
          <LineField
            field={fields.reason}
            label="Why it may stand for the film"
            hint="All who see the library read it"
          />
        </div>
        <div className="mt-3">
          <input type="hidden" name="intent" value="add" />
          <SubmitButton busy="Adding">Add value</SubmitButton>
        </div>
      </Form>
    </details>
  );
}
