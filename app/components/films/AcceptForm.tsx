import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { useId } from "react";
import { Form, Link } from "react-router";
import { CheckField } from "#app/components/forms/CheckField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";

type Values = { reason: string; instrument: string; measuredAt: string; use: boolean };

interface Props {
  scan: { id: string; program: string };
  film: { version: number; usesMean: boolean };
  instruments: readonly string[];
  measuredOn: string;
  instrument: string;
  lastResult: SubmissionResult<string[]> | null | undefined;
}

/** What a person says when they accept a scan. */
export function AcceptForm({ scan, film, instruments, measuredOn, instrument, lastResult }: Props) {
  const defaultValue = { measuredAt: measuredOn, instrument };
  const [form, fields] = useRecordForm<Values>({ id: "accept", lastResult, defaultValue });
  const known = useId();
  return (
    <Form method="post" {...getFormProps(form)} aria-label="Accept" className="border-t border-ink p-4 tablet:px-6">
      <FormHead lastResult={lastResult} />
      <input type="hidden" name="version" value={film.version} />
      <LineField
        field={fields.reason}
        label="Why this value may stand for the film"
        hint={`Only who may see ${scan.program} reads it`}
        input={{ maxLength: 300, autoComplete: "off" }}
      />
      <div className="mt-3 grid gap-3 tablet:grid-cols-2">
        <LineField
          field={fields.instrument}
          label="Instrument"
          hint="Blank: not named. Each instrument has its own chart; all who see the library read it"
          input={{ list: known, maxLength: 80, autoComplete: "off" }}
        />
        <datalist id={known}>
          {instruments.map((name) => (
            <option key={name} value={name} />
          ))}
        </datalist>
        <LineField
          field={fields.measuredAt}
          label="Measured on"
          hint="Order of the chart"
          input={{ placeholder: "year-month-day", autoComplete: "off" }}
        />
      </div>
      {!film.usesMean && (
        <div className="mt-2">
          <CheckField field={fields.use} label="From now on the film uses the mean of its accepted values" />
        </div>
      )}
      <div className="mt-3 flex flex-wrap gap-2">
        <SubmitButton busy="Accepting">Accept into the history</SubmitButton>
        <Link to={`/scans/${scan.id}`} className="btn">
          Back to the scan
        </Link>
      </div>
    </Form>
  );
}
