import { useState } from "react";
import { SelectField, type Option } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { StepInput } from "#app/engine/flow/model.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { HOLDINGS } from "#app/engine/vocabulary.ts";
import { quantityText } from "#app/lib/form-values.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { RULES } from "#app/schemas/ranges.ts";
import type { ChosenField, TypedField, WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";
import { Understood } from "#app/components/units/Understood.tsx";

const TYPED = {
  siliconAfter: { rule: RULES.siliconThickness, unit: "µm" },
  peakTemperature: { rule: RULES.temperature, unit: "°C" },
  filmThickness: { rule: RULES.filmThickness, unit: "µm" },
  filmStress: { rule: RULES.stress, unit: "MPa" },
} as const;
const isTyped = (field: string): field is TypedField => field in TYPED;

/** What can be tried at a step, as 'field' or 'field nth-film'. */
function quantitiesOf(step: StepInput): Option[] {
  return [
    ...(step.siliconAfter ? [{ value: "siliconAfter", label: "Silicon after the step" }] : []),
    { value: "peakTemperature", label: "Peak temperature" },
    { value: "planned", label: "Held by, as planned" },
    ...(step.bond
      ? [
          { value: "carrier", label: "Carrier" },
          { value: "bondingMaterial", label: "Bonding material" },
        ]
      : []),
    ...step.adds.flatMap(({ film }, at) => [
      { value: `filmThickness ${at}`, label: `Thickness of ${film.name}` },
      { value: `filmStress ${at}`, label: `Stress of ${film.name}` },
    ]),
  ];
}

/** The value that a quantity has now, as the text of its field. */
function presentOf(step: StepInput, field: TypedField | ChosenField, film: number | null): string {
  const addition = film === null ? undefined : step.adds[film];
  const text = (value: number | undefined, dimension: Dimension, unit: string) => quantityText(value, dimension, unit);
  switch (field) {
    case "siliconAfter":
      return text(step.siliconAfter?.value, "length", "µm");
    case "peakTemperature":
      return text(step.peakTemperature, "temperature", "°C");
    case "filmThickness":
      return text(addition?.thickness.value, "length", "µm");
    case "filmStress":
      return text(addition?.stress.value, "stress", "MPa");
    case "planned":
      return step.planned;
    case "carrier":
      return step.bond?.carrier.id ?? "";
    case "bondingMaterial":
      return step.bond?.material.id ?? "";
  }
}

function choicesOf(field: ChosenField, { carriers, materials }: WhatIfSnapshot): Option[] {
  if (field === "planned") return HOLDINGS.map((holding) => ({ value: holding, label: holding }));
  return (field === "carrier" ? carriers : materials).map(({ id, name }) => ({ value: id, label: name }));
}

interface Props {
  snapshot: WhatIfSnapshot;
  /** told of each change as it is typed; of null while it is not understood or is what the flow has already */
  onChange: (change: WhatIfChange | null) => void;
  /** another quantity is turned to: what was typed is to stand */
  onTurn: () => void;
}

/** One quantity of one step, tried at another value. */
export function WhatIfEditor({ snapshot, onChange, onTurn }: Props) {
  const { steps } = snapshot.input;
  const thinned = steps.findLastIndex(({ siliconAfter }) => siliconAfter !== null);
  const [at, setAt] = useState(Math.max(0, thinned));
  const step = steps[at];
  const [quantity, setQuantity] = useState(thinned >= 0 ? "siliconAfter" : "peakTemperature");
  const [name, nth] = quantity.split(" ");
  const field = name as TypedField | ChosenField;
  const film = nth === undefined ? null : Number(nth);
  const present = step ? presentOf(step, field, film) : "";
  const [text, setText] = useState(present);
  if (!step) return null;

  const choose = (index: number, next: string) => {
    const target = steps[index];
    if (!target) return;
    const [nextName, nextNth] = next.split(" ");
    setAt(index);
    setQuantity(next);
    setText(presentOf(target, nextName as TypedField | ChosenField, nextNth === undefined ? null : Number(nextNth)));
    onTurn();
  };
  const type = (typed: string) => {
    setText(typed);
    const place = { step: snapshot.stepIds[at] ?? "", film };
    if (typed === present) return onChange(null);
    if (!isTyped(field)) return onChange({ ...place, field, value: typed });
    const read = readQuantity(typed, TYPED[field].rule);
    onChange(read.ok ? { ...place, field, value: read.value } : null);
  };
  const quantities = quantitiesOf(step);
  const reading = isTyped(field) ? readQuantity(text, TYPED[field].rule) : null;
  const now = isTyped(field) ? present : choicesOf(field, snapshot).find(({ value }) => value === present)?.label;
  return (
    <div className="grid gap-3 tablet:grid-cols-3">
      <SelectField
        name="what-if-step"
        label="At step"
        options={steps.map(({ title }, index) => ({ value: String(index), label: `${index + 1}, ${title}` }))}
        value={String(at)}
        onChange={(event) => {
          const next = Number(event.currentTarget.value);
          const target = steps[next];
          const still = target && quantitiesOf(target).some(({ value }) => value === quantity);
          choose(next, still ? quantity : "peakTemperature");
        }}
      />
      <SelectField
        name="what-if-quantity"
        label="Try another"
        options={quantities}
        value={quantity}
        onChange={(event) => choose(at, event.currentTarget.value)}
      />
      {isTyped(field) ? (
        <TextField
          name="what-if-value"
          label="Value"
          value={text}
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => type(event.currentTarget.value)}
          hint={
            <>
              {reading?.ok && <Understood text={reading.understood} dimension={TYPED[field].rule.dimension} />}
              {reading?.ok ? "; now " : "Now "}
              {now && <Understood text={now} dimension={TYPED[field].rule.dimension} />}
            </>
          }
          error={reading && !reading.ok ? reading.message : undefined}
        />
      ) : (
        <SelectField
          name="what-if-value"
          label="Value"
          options={choicesOf(field, snapshot)}
          value={text}
          onChange={(event) => type(event.currentTarget.value)}
          hint={`Now ${now}`}
        />
      )}
    </div>
  );
}
