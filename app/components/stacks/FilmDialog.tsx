import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { useEffect, useRef, useState } from "react";
import { useFetcher } from "react-router";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { Understood } from "#app/components/units/Understood.tsx";

interface Props {
  /** in this stack, as far as it is typed */
  thickness: string;
  onAdded: (film: { id: string; name: string; thickness: string }) => void;
  onClose: () => void;
}

type FilmText = {
  name: string;
  kind: string;
  stress: MeasuredText;
  youngsModulus: MeasuredText;
  poissonsRatio: MeasuredText;
  expansion: MeasuredText;
};

type Answer = { lastResult: SubmissionResult<string[]> | null; savedAs: string | null };

/** Parts of a film that have a source each. */
const MEASURED = ["stress", "youngsModulus", "poissonsRatio", "expansion"] as const;

/** A film typed beside the stack, with the least that an estimate needs: it goes into the library, and into this place of the stack. */
export function FilmDialog({ thickness, onAdded, onClose }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const fetcher = useFetcher<Answer>();
  const [form, fields] = useRecordForm<FilmText>({ id: "film-typed", lastResult: fetcher.data?.lastResult });
  const [source, setSource] = useState("assumed");
  const [thick, setThick] = useState(thickness);
  const read = readQuantity(thick, RULES.filmThickness);
  const savedAs = fetcher.state === "idle" ? (fetcher.data?.savedAs ?? null) : null;
  const { value: name = "" } = fields.name;
  const done = useRef(onAdded);
  useEffect(() => {
    done.current = onAdded;
  });
  useEffect(() => dialog.current?.showModal(), []);
  // By then the page knows the library anew, this film in it.
  useEffect(() => {
    if (savedAs !== null) done.current({ id: savedAs, name, thickness: thick });
  }, [savedAs, name, thick]);
  const part = (of: (typeof MEASURED)[number]) => fields[of].getFieldset().value;
  return (
    <dialog
      ref={dialog}
      className="m-auto w-full max-w-150 border border-ink bg-raised p-4 text-ink backdrop:bg-ink/40 tablet:p-6"
      aria-labelledby="film-typed-head"
      onClose={onClose}
    >
      <fetcher.Form method="post" action="/films/new?stay" {...getFormProps(form)}>
        <h2 id="film-typed-head" className="text-lead font-semibold">
          A film that the library lacks
        </h2>
        <p className="mt-1 mb-3 text-quiet">
          It goes into the library of the site, and into this place of the stack. Everything else of it can be added
          later.
        </p>
        <FormHead lastResult={fetcher.data?.lastResult} />
        <div className="grid grid-cols-2 gap-x-3 gap-y-2">
          <LineField field={fields.name} label="Name" className="col-span-2 tablet:col-span-1" />
          <ChoiceField
            field={fields.kind}
            label="Kind"
            choices={sameWords(FILM_KINDS)}
            blank="Choose"
            className="col-span-2 tablet:col-span-1"
          />
          <QuantityField
            field={part("stress")}
            label="Stress at 25&nbsp;°C"
            dimension="stress"
            rule={RULES.stress}
            example="-80 MPa"
            hint="Tension positive"
          />
          <TextField
            name="in-stack"
            label="Thickness in this stack"
            value={thick}
            placeholder="5 µm"
            autoComplete="off"
            hint={read.ok ? <Understood text={read.understood} dimension="length" /> : "May be typed later"}
            error={read.ok || read.blank ? undefined : read.message}
            onChange={(event) => setThick(event.currentTarget.value)}
          />
          <QuantityField
            field={part("youngsModulus")}
            label="Young’s modulus"
            dimension="stress"
            rule={RULES.modulus}
            example="3 GPa"
          />
          <QuantityField
            field={part("poissonsRatio")}
            label="Poisson’s ratio"
            dimension="number"
            rule={RULES.poissonsRatio}
            example="0.35"
          />
          <QuantityField
            field={part("expansion")}
            label="Expansion"
            dimension="expansion"
            rule={RULES.expansion}
            example="42 ppm/K"
          />
          <SelectField
            name="from"
            label="Source of these values"
            value={source}
            options={sameWords(SOURCE_KINDS)}
            onChange={(event) => setSource(event.currentTarget.value)}
          />
        </div>
        {MEASURED.map((of) => (
          <input key={of} type="hidden" name={`${of}.source`} value={source} readOnly />
        ))}
        <div className="mt-4 flex flex-wrap gap-2">
          <button type="submit" className="btn btn-primary">
            {fetcher.state === "idle" ? "Add to library and stack" : "Adding"}
          </button>
          <button type="button" className="btn" onClick={() => dialog.current?.close()}>
            Do not add it
          </button>
        </div>
      </fetcher.Form>
    </dialog>
  );
}
