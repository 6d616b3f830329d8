import type { FieldMetadata, SubmissionResult } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { CountFields } from "#app/components/incidents/CountFields.tsx";
import { PhotoField } from "#app/components/incidents/PhotoField.tsx";
import { ShardCaution } from "#app/components/incidents/ShardCaution.tsx";
import { SpotFields } from "#app/components/incidents/SpotFields.tsx";
import { floorPath } from "#app/lib/floor/floor-path.ts";
import { INCIDENT_KINDS, SEVERITIES } from "#app/schemas/incident.ts";
import { FloorForm } from "./FloorForm.tsx";
import type { FloorStepProps } from "./FloorStepPage.tsx";

interface Props extends Omit<FloorStepProps, "deed"> {
  lastResult: SubmissionResult<string[]> | null;
}

type Values = Record<
  "kind" | "severity" | "wafer" | "affected" | "broken" | "through" | "words" | "radius" | "azimuth",
  string
>;

/** An incident at the step on the screen, for gloves; it waits on the device where there is no connection. */
export function FloorIncidentForm({ lot, sheet, step, newId, lastResult }: Props) {
  const [form, typed] = useRecordForm<Values>({
    id: "floor-incident",
    lastResult,
    defaultValue: { affected: "1", broken: "0" },
  });
  const fields = typed as unknown as { [Name in keyof Values]: FieldMetadata<string> };
  const here = floorPath(lot.id, step.number, sheet.leg);
  return (
    <FloorForm
      id={form.id}
      noValidate
      encType="multipart/form-data"
      action={floorPath(lot.id, step.number, sheet.leg, "incident")}
      next={here}
      words={`Incident, step ${step.number}`}
      className="floor-form max-w-160 space-y-2 text-lead"
    >
      <p className="text-quiet">
        Lot {lot.name}, step {step.number}, {step.title}
      </p>
      <h1 className="text-answer font-medium">Report an incident</h1>
      <ShardCaution />
      <input type="hidden" name="intent" value="incident" />
      <input type="hidden" name="id" value={newId} />
      <input type="hidden" name="revision" value={sheet.pin.revision} />
      <input type="hidden" name="assessment" value={sheet.pin.assessment} />
      <input type="hidden" name="leg" value={sheet.leg} />
      <input type="hidden" name="step" value={step.number} />
      <ChoiceField field={fields.kind} label="What happened" choices={sameWords(INCIDENT_KINDS)} blank="Choose" />
      <ChoiceField
        field={fields.severity}
        label="How bad"
        choices={sameWords(SEVERITIES)}
        blank="Choose"
        hint="The worst that came of it"
      />
      <LineField field={fields.wafer} label="Wafer" hint="Its name, or its slot. Blank: several, or not known" />
      <CountFields affected={fields.affected} broken={fields.broken} through={fields.through} />
      <NoteField field={fields.words} label="In your words" rows={4} hint="What was seen, heard and done" />
      <PhotoField id="photos" faults={lastResult?.error?.["photos"] ?? []} again={Boolean(lastResult?.error)} />
      <SpotFields radius={fields.radius} azimuth={fields.azimuth} />
      <p>
        The people of the program are told as soon as the server has it. A report is never changed; notes are added.
      </p>
      <div className="flex flex-wrap gap-3 pt-2">
        <button type="submit" className="btn btn-primary min-h-27 min-w-60 flex-1 text-figure">
          Report it
        </button>
        <a href={here} className="btn min-h-27 min-w-40 text-figure">
          Back
        </a>
      </div>
    </FloorForm>
  );
}
