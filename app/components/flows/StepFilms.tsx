import type { FieldMetadata, FormMetadata } from "@conform-to/react";
import { useRef } from "react";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { FilmCutFields } from "#app/components/forms/FilmCutFields.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import type { ExplainedChoice } from "#app/lib/flow-step-choices.ts";
import { ExplainedChoiceField } from "./ExplainedChoiceField.tsx";
import { NEW_FILM, type FilmChangeValues, type StepFormValues } from "./step-form-values.ts";

const CHANGES = [
  { value: "adds", label: "Adds a film" },
  { value: "removes", label: "Removes a film" },
];
const SIDES = [
  { value: "front", label: "Device side" },
  { value: "back", label: "Back side" },
];

interface Props {
  form: FormMetadata<StepFormValues>;
  field: FieldMetadata<FilmChangeValues[] | undefined>;
  films: readonly ExplainedChoice[];
}

/** The films that a step adds or takes off. Lines are added and removed without a server, and by the server without scripts. */
export function StepFilms({ form, field, films }: Props) {
  const add = useRef<HTMLButtonElement>(null);
  // A post that is not from this form may have sent something else under the name of the list.
  const lines = Array.isArray(field.initialValue) ? field.getFieldList() : [];
  return (
    <section aria-labelledby="films-head" className="border-t border-ink pt-4">
      <h2 id="films-head" className="font-semibold">
        Films
      </h2>
      <p className="text-quiet">
        {lines.length === 0
          ? "This step neither adds nor removes a film."
          : "Taken off first, then put down, in this order."}
      </p>
      {field.errors && <p className="text-label text-stop">{field.errors[0]}</p>}
      {lines.map((line, index) => (
        <FilmLine key={line.key} line={line} number={index + 1} films={films}>
          <button
            {...form.remove.getButtonProps({ name: field.name, index })}
            className="btn btn-remove"
            // The button goes with its line; without this the focus would start again at the top of the page.
            onClick={() => add.current?.focus()}
          >
            Take line {index + 1} out
          </button>
        </FilmLine>
      ))}
      <button
        ref={add}
        {...form.insert.getButtonProps({ name: field.name, defaultValue: NEW_FILM })}
        className="btn mt-3"
      >
        {lines.length === 0 ? "Add or remove a film" : "Another film"}
      </button>
    </section>
  );
}

interface LineProps {
  line: FieldMetadata<FilmChangeValues>;
  number: number;
  films: readonly ExplainedChoice[];
  children: React.ReactNode;
}

function FilmLine({ line, number, films, children }: LineProps) {
  const parts = line.getFieldset();
  return (
    <fieldset className="group/film mt-3 border border-line p-3">
      <legend className="px-1 text-label text-quiet">Film, line {number}</legend>
      <div className="grid gap-3 tablet:grid-cols-[10rem_9rem_minmax(0,1fr)]">
        <ChoiceField field={parts.change} label="What happens" choices={CHANGES} />
        <ChoiceField field={parts.side} label="Side" choices={SIDES} />
        <ExplainedChoiceField field={parts.film} label="Film" choices={films} blank="Choose a film" />
      </div>
      <div className={`mt-3 space-y-3 ${ONLY_ADDED}`}>
        <FilmCutFields field={line} />
        <MeasuredField field={parts.thickness} label="Film thickness" dimension="length" example="5 um" />
        <MeasuredField
          field={parts.stress}
          label="Stress for this step only"
          dimension="stress"
          example="+20 MPa"
          hint="Blank keeps the film’s own"
        />
      </div>
      <div className="mt-3 border-t border-line pt-3">{children}</div>
    </fieldset>
  );
}

/** A removal takes the whole film, so these have no meaning there; what holds a fault stays in sight. */
const ONLY_ADDED = "group-has-[option[value=removes]:checked]/film:hidden noscript:!block has-[[aria-invalid]]:!block";
