import type { FieldMetadata, SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { LotAtPlace } from "#app/schemas/hand-over.ts";
import { FloorHead } from "./FloorHead.tsx";

interface Props {
  lots: readonly LotAtPlace[];
  places: readonly string[];
  given: string;
  person: string;
  lastResult: SubmissionResult<string[]> | null | undefined;
}

// A type, for an interface has no index signature.
type Values = {
  place: string;
  remark: string;
  lots: { lot: string; on: string; remark: string }[];
};

/** What a shift leaves at a place: which lots are there, on what, and what the next one has to know. */
export function GiveOverForm({ lots, places, given, person, lastResult }: Props) {
  const [form, fields] = useRecordForm<Values>({
    id: "give-over",
    lastResult,
    defaultValue: { place: "", remark: "", lots: lots.map(({ on }) => ({ lot: "", on, remark: "" })) },
  });
  return (
    <>
      <FloorHead person={person} />
      <main id="main" className="mx-auto max-w-240 px-4 py-6 tablet:px-6">
        <h1 className="text-answer font-medium">Hand a place over</h1>
        {lots.length === 0 ? (
          <p className="mt-3 text-lead">
            No lot was worked on in the last 30 days, so there is nothing to hand over. A lot stands here once it is on
            a sheet.{" "}
            <a href="/floor" className="link">
              Find a lot
            </a>
          </p>
        ) : (
          <Form method="post" discover="none" id={form.id} noValidate className="floor-form mt-3 space-y-3 text-lead">
            <FormHead lastResult={lastResult} stands="Nothing is handed over yet" />
            <p>
              Where each lot is in its flow, its clocks, its holds and stops and the odd readings of the last 12 h are
              written down by themselves. Whoever takes the place over acknowledges them.
            </p>
            <input type="hidden" name="given" value={given} />
            <LineField
              field={fields.place}
              label="Place"
              hint="The tool, bench or cabinet, as everybody here calls it."
              input={{ list: "places", autoComplete: "off" }}
            />
            <datalist id="places">
              {places.map((place) => (
                <option key={place} value={place} />
              ))}
            </datalist>
            <fieldset aria-describedby={fields.lots.errorId}>
              <legend className="text-lead font-semibold">Lots that are there</legend>
              <p id={fields.lots.errorId} className={fields.lots.errors ? "font-semibold text-stop" : "text-quiet"}>
                {fields.lots.errors?.[0] ?? "Tick each one, and say on which carrier, frame or tool it is."}
              </p>
              <ul className="mt-1 border-t border-ink">
                {fields.lots.getFieldList().map((field, index) => {
                  const lot = lots[index];
                  return lot && <LotRow key={lot.id} field={field} lot={lot} />;
                })}
              </ul>
            </fieldset>
            <NoteField
              field={fields.remark}
              label="What the next shift has to know of the place"
              hint="May stay empty."
            />
            <div className="flex flex-wrap gap-3 pt-2">
              <SubmitButton busy="Handing over" className="min-h-27 min-w-60 flex-1 text-figure">
                Hand it over
              </SubmitButton>
              <a href="/floor/hand-overs" className="btn min-h-27 min-w-40 text-figure">
                Back
              </a>
            </div>
          </Form>
        )}
      </main>
    </>
  );
}

type LotField = FieldMetadata<Values["lots"][number]>;

function LotRow({ field, lot }: { field: LotField; lot: LotAtPlace }) {
  const parts = field.getFieldset();
  return (
    <li className="group border-b border-line py-3">
      <label className="flex min-h-14 items-center gap-4">
        <input
          type="checkbox"
          name={parts.lot.name}
          value={lot.id}
          defaultChecked={parts.lot.value === lot.id}
          className="size-8 flex-none accent-ink"
        />
        <span className="min-w-0">
          <b className="text-figure wrap-anywhere">{lot.name}</b>{" "}
          <span className="text-quiet">
            {lot.program}, {lot.sheet === null ? "on no sheet" : `sheet ${lot.sheet}`}
            {lot.place !== "" && `, handed over last at ${lot.place}`}
          </span>
        </span>
      </label>
      {/* Asked of what is there only, so that many lots are still quickly gone through. */}
      <div className="hidden gap-3 group-has-checked:grid tablet:grid-cols-2">
        <LineField field={parts.on} label={`Lot ${lot.name} is on`} hint="Carrier, frame or tool." />
        <LineField field={parts.remark} label={`What to know of lot ${lot.name}`} hint="May stay empty." />
      </div>
    </li>
  );
}
