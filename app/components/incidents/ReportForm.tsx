import { getFormProps, getInputProps, type SubmissionResult } from "@conform-to/react";
import { Form, Link } from "react-router";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { INCIDENT_KINDS, SEVERITIES, type ReportGround } from "#app/schemas/incident.ts";
import { CountFields } from "./CountFields.tsx";
import { PhotoField } from "./PhotoField.tsx";
import { SpotFields } from "./SpotFields.tsx";

type Values = {
  id: string;
  assessment: string;
  leg: string;
  step: string;
  lot: string;
  wafer: string;
  kind: string;
  severity: string;
  radius: string;
  azimuth: string;
  affected: string;
  broken: string;
  through: string;
  words: string;
  occurredAt: string;
};

interface Props {
  ground: ReportGround;
  lastResult: SubmissionResult<string[]> | undefined;
}

/** What happened, where, to how many wafers, with photos. Works without scripts: the place on the wafer is then typed. */
export function ReportForm({ ground, lastResult }: Props) {
  const { assessment, legs, steps, lots, given } = ground;
  const [form, fields] = useRecordForm<Values>({
    id: "incident",
    lastResult,
    defaultValue: { assessment: assessment.id, affected: "1", broken: "0", ...given },
  });
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} className="frame max-w-300">
      <div className="p-4 empty:hidden tablet:px-6">
        <FormHead lastResult={lastResult} />
      </div>
      <input {...getInputProps(fields.assessment, { type: "hidden" })} key={fields.assessment.key} />
      <input {...getInputProps(fields.id, { type: "hidden" })} key={fields.id.key} />
      <div className="grid wide:grid-cols-2">
        <fieldset className="min-w-0 p-4 tablet:p-6">
          <legend className="float-left mb-3 w-full font-semibold">What happened</legend>
          <div className="clear-both grid gap-x-3 gap-y-2 tablet:grid-cols-2">
            <ChoiceField field={fields.kind} label="What" choices={sameWords(INCIDENT_KINDS)} blank="Choose" />
            <ChoiceField
              field={fields.severity}
              label="How bad"
              choices={sameWords(SEVERITIES)}
              blank="Choose"
              hint="The worst that came of it"
            />
            <ChoiceField
              field={fields.step}
              label="At which step"
              choices={steps}
              blank="Choose the step"
              className="tablet:col-span-2"
            />
            {legs.length > 0 ? (
              <ChoiceField
                field={fields.leg}
                label="Slots"
                choices={legs}
                className="tablet:col-span-2"
                hint="The flow parts by slot"
              />
            ) : (
              <input {...getInputProps(fields.leg, { type: "hidden" })} key={fields.leg.key} />
            )}
            <LineField
              field={fields.lot}
              label="Lot"
              hint="As it stands on its box"
              input={{ list: "lots-known", autoComplete: "off" }}
            />
            <datalist id="lots-known">
              {lots.map((name) => (
                <option key={name} value={name} />
              ))}
            </datalist>
            <LineField
              field={fields.wafer}
              label="Wafer"
              hint="Its name, or its slot. Blank: several, or not known"
              input={{ autoComplete: "off" }}
            />
            <CountFields affected={fields.affected} broken={fields.broken} through={fields.through} />
            <LineField
              field={fields.occurredAt}
              label="Happened at, UTC"
              hint="Year-month-day hour:minute"
              input={{ autoComplete: "off" }}
            />
          </div>
        </fieldset>
        <div className="min-w-0 space-y-4 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
          <SpotFields radius={fields.radius} azimuth={fields.azimuth} />
          <NoteField field={fields.words} label="In your words" rows={4} hint="What was seen, heard and done" />
          <PhotoField id="photos" faults={lastResult?.error?.["photos"] ?? []} again={Boolean(lastResult?.error)} />
        </div>
      </div>
      <div className="flex flex-wrap items-center gap-2 border-t border-ink p-4 tablet:px-6">
        <SubmitButton busy="Reporting">Report it</SubmitButton>
        <Link to="/incidents" className="btn">
          Leave without reporting
        </Link>
        <p className="text-quiet">
          The people of the program are told at once. A report is never changed; notes are added.
        </p>
      </div>
    </Form>
  );
}
