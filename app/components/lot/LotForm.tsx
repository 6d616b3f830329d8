import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form, Link } from "react-router";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { SLOTS } from "#app/lib/cassette.ts";

/** A lot as the text of its form. */
export type LotFormValues = {
  name: string;
  bow: string;
  thickness: string;
  warp: string;
  edgeChips: string;
  identity: string;
  wafers: string;
  file: string;
};

interface Props {
  /** what was typed before; nothing on a first visit */
  typed: Partial<LotFormValues>;
  /** changes with every answer of the server: the browser then lets go of the file, whose rows are in the list */
  sent: number;
  lastResult: SubmissionResult<string[]> | null | undefined;
  /** what the assessment took for granted: '+22 µm' and '725 µm' */
  assessed: { bow: string | null; thickness: string };
  asksWarp: boolean;
  back: string;
}

const EDGES = [
  { value: "none", label: "Inspected, no chips" },
  { value: "found", label: "Chips found" },
];
const IDENTITY = [
  { value: "matches", label: "Read, is that of the flow" },
  { value: "differs", label: "Differs" },
];

/** A lot's own figures, as a mean or wafer by wafer. */
export function LotForm({ typed, sent, lastResult, assessed, asksWarp, back }: Props) {
  const [form, fields] = useRecordForm<LotFormValues>({ id: "lot", lastResult, defaultValue: typed });
  const listFaults = fields.wafers.errors ?? [];
  const fileFault = fields.file.errors?.[0];
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} aria-labelledby="lot-head">
      <div className="p-4 tablet:px-6">
        <h2 id="lot-head" className="text-lead font-medium">
          The lot as it came in
        </h2>
        <FormHead lastResult={lastResult} />
      </div>
      <div className="grid wide:grid-cols-2">
        <div className="grid min-w-0 content-start gap-x-3 gap-y-2 px-4 pb-4 tablet:grid-cols-2 tablet:px-6">
          <LineField
            field={fields.name}
            label="Lot"
            hint="As it stands on its box"
            className="tablet:col-span-2"
            input={{ autoComplete: "off", maxLength: 40 }}
          />
          <QuantityField
            field={fields.bow}
            label="Mean bow"
            dimension="length"
            example="-180 µm"
            hint={`Device side up, centre above is positive${assessed.bow === null ? "" : `; assessed for ${assessed.bow}`}`}
          />
          <QuantityField
            field={fields.thickness}
            label="Mean thickness"
            dimension="length"
            example="725 µm"
            hint={`Blank: as assessed, ${assessed.thickness}`}
          />
          {asksWarp ? (
            <QuantityField
              field={fields.warp}
              label="Largest warp"
              dimension="length"
              hint="The flow has a limit for it"
            />
          ) : null}
          <ChoiceField field={fields.edgeChips} label="Edges" choices={EDGES} blank="Not inspected" />
          <ChoiceField field={fields.identity} label="Wafer marks" choices={IDENTITY} blank="Not read" />
        </div>
        <div className="min-w-0 px-4 pb-4 tablet:px-6">
          <div className="field">
            <label htmlFor={fields.wafers.id}>Wafers one by one, instead of the mean</label>
            <textarea
              key={sent}
              id={fields.wafers.id}
              name={fields.wafers.name}
              defaultValue={typed.wafers}
              rows={9}
              spellCheck={false}
              placeholder={"slot, bow, thickness\n1, -176, 724.8\n2, -183, 725.3"}
              aria-invalid={listFaults.length > 0 ? true : undefined}
              aria-describedby={fields.wafers.errorId}
              className="tabular-nums"
            />
            <small id={fields.wafers.errorId}>
              {listFaults.length > 0
                ? listFaults.map((fault) => (
                    <span key={fault} className="block">
                      {fault}
                    </span>
                  ))
                : `Slot, bow, thickness, a line each, up to ${SLOTS}; µm unless a unit stands beside it. With a decimal comma, semicolons between the columns.`}
            </small>
          </div>
          <div className="field mt-2">
            <label htmlFor={fields.file.id}>Or a file with such lines</label>
            <input
              key={sent}
              type="file"
              id={fields.file.id}
              name={fields.file.name}
              accept=".csv,.txt,.tsv,text/csv,text/plain"
              aria-invalid={fileFault ? true : undefined}
              aria-describedby={fields.file.errorId}
              className="file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
            />
            <small id={fields.file.errorId}>{fileFault ?? "It takes the place of the list above"}</small>
          </div>
        </div>
      </div>
      <div className="flex flex-wrap items-center gap-2 border-t border-ink p-4 tablet:px-6">
        <SubmitButton busy="Assessing the lot">Try this lot</SubmitButton>
        <Link to={back} className="btn">
          Back to the assessment
        </Link>
        <p className="text-quiet">Trying stores nothing. The flow stays as it is.</p>
      </div>
    </Form>
  );
}
