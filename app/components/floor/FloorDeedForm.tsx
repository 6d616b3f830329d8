import { type FieldMetadata, type SubmissionResult } from "@conform-to/react";
import type { ReactNode } from "react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { BLOCK_CAUSE_NAMES } from "#app/lib/floor/block-causes.ts";
import { floorPath, type FloorDeed } from "#app/lib/floor/floor-path.ts";
import { GRAVITY, MEASURED_ON, MEASURED_SIDES } from "#app/lib/floor/measured-how.ts";
import { EntryFields } from "./EntryFields.tsx";
import { FloorForm } from "./FloorForm.tsx";
import type { FloorStepProps } from "./FloorStepPage.tsx";

/** An incident has a form of its own. */
type Deed = Exclude<FloorDeed, "incident">;

interface Props extends Omit<FloorStepProps, "deed"> {
  deed: Deed;
  lastResult: SubmissionResult<string[]> | null;
}

type Values = Record<
  | "what"
  | "value"
  | "uncertainty"
  | "wafer"
  | "on"
  | "sideUp"
  | "gravity"
  | "remark"
  | "text"
  | "count"
  | "cause"
  | "reason",
  string
>;
type Fields = { [Name in keyof Values]: FieldMetadata<string> };

const TITLES: Record<Deed, { title: string; button: string; about: string }> = {
  measure: {
    title: "Record a reading",
    button: "Save the reading",
    about:
      "Bow is positive when the centre lies above the plane with the device side up. Only like is compared with like: say how it was measured.",
  },
  observe: { title: "Write an observation", button: "Save it", about: "What you saw, in your own words." },
  stop: {
    title: "Stop this step",
    button: "Stop it for every lot",
    about:
      "No lot of this sheet starts this step until the stop is cleared. Everybody who works in the program is told at once.",
  },
  hold: {
    title: "Hold this lot",
    button: "Hold the lot",
    about:
      "Nothing of this lot starts until the hold is cleared. Other lots go on. Everybody who works in the program is told.",
  },
};

/** What is entered of a step beside that it is done: one form a screen. */
export function FloorDeedForm({ lot, sheet, step, deed, newId, lastResult }: Props) {
  const { title, button, about } = TITLES[deed];
  const [form, fields] = useRecordForm<Values>({
    id: `floor-${deed}`,
    lastResult,
    defaultValue: { what: "bow", sideUp: step.bow.deviceSideUp ? "device side" : "back side" },
  });
  const blocks = deed === "stop" || deed === "hold";
  return (
    <FloorForm
      id={form.id}
      noValidate
      action={floorPath(lot.id, step.number, sheet.leg, deed)}
      next={floorPath(lot.id, step.number, sheet.leg)}
      words={`${title}, step ${step.number}`}
      className="floor-form max-w-160 space-y-2 text-lead"
    >
      <p className="text-quiet">
        Lot {lot.name}, step {step.number}, {step.title}
      </p>
      <h1 className={`text-answer font-medium ${blocks ? "text-stop" : ""}`}>{title}</h1>
      <p>{about}</p>
      <DeedFields deed={deed} fields={fields as unknown as Fields} />
      {blocks ? (
        <>
          <input type="hidden" name="intent" value={deed} />
          <input type="hidden" name="id" value={newId} />
          <input type="hidden" name="revision" value={sheet.pin.revision} />
          <input type="hidden" name="leg" value={sheet.leg} />
          <input type="hidden" name="step" value={step.number} />
        </>
      ) : (
        <EntryFields sheet={sheet} id={newId} kind={deed === "measure" ? "measured" : "observed"} step={step.number} />
      )}
      <div className="flex flex-wrap gap-3 pt-2">
        <button
          type="submit"
          className={`btn min-h-27 min-w-60 flex-1 text-figure ${blocks ? "btn-remove" : "btn-primary"}`}
        >
          {button}
        </button>
        <a href={floorPath(lot.id, step.number, sheet.leg)} className="btn min-h-27 min-w-40 text-figure">
          Back
        </a>
      </div>
    </FloorForm>
  );
}

function DeedFields({ deed, fields }: { deed: Deed; fields: Fields }): ReactNode {
  const count = (
    <LineField field={fields.count} label="How many wafers" hint="May stay empty." input={{ inputMode: "numeric" }} />
  );
  switch (deed) {
    case "measure":
      return (
        <>
          <ChoiceField field={fields.what} label="What" choices={sameWords(["bow", "warp"])} />
          <LineField field={fields.value} label="Reading with its unit" hint="Such as −41 µm or 0.2 mm" />
          <LineField field={fields.uncertainty} label="Its uncertainty, k = 2" hint="May stay empty." />
          <LineField field={fields.wafer} label="Wafer" hint="May stay empty." />
          <ChoiceField
            field={fields.on}
            label="It lay on"
            choices={sameWords(MEASURED_ON)}
            blank="Choose what held it"
          />
          <ChoiceField field={fields.sideUp} label="Side up" choices={sameWords(MEASURED_SIDES)} />
          <ChoiceField
            field={fields.gravity}
            label="Its own weight was"
            choices={sameWords(GRAVITY)}
            blank="Choose"
            hint="A bow with the weight taken out, entered when its step is done, is held against the prediction."
          />
          <NoteField field={fields.remark} label="Remark" rows={2} hint="May stay empty." />
        </>
      );
    case "observe":
      return (
        <>
          <NoteField field={fields.text} label="What you saw" rows={4} />
          {count}
        </>
      );
    case "stop":
    case "hold":
      return (
        <>
          <ChoiceField
            field={fields.cause}
            label="Cause"
            choices={sameWords(BLOCK_CAUSE_NAMES)}
            blank="Choose the cause"
            hint="It says who may clear it."
          />
          <NoteField field={fields.reason} label="What happened" rows={3} />
        </>
      );
  }
}
