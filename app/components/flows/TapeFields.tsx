import type { FieldMetadata } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { RESISTANCE_WORDS } from "#app/engine/flow/handling-inputs.ts";
import { YES_OR_NO } from "./HandlingFields.tsx";
import type { StepHandlingText } from "./step-handling-values.ts";

const STANDS = [
  ["tapeVacuum", "Vacuum"],
  ["tapePlasma", "Plasma"],
  ["tapeSolvent", "Solvent"],
  ["tapeAcid", "Acid"],
  ["tapeBase", "Base"],
  ["tapeUltraviolet", "Ultraviolet light"],
] as const;

/** The tape that a step puts the wafer on, and what it stands. */
export function TapeFields({ field }: { field: FieldMetadata<StepHandlingText | undefined> }) {
  const parts = field.getFieldset();
  return (
    <>
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField field={parts.tapeName} label="Tape" hint="By its type, as the floor calls it" />
        <ChoiceField
          field={parts.tapeReleasesInLight}
          label="Ultraviolet light lets it go"
          choices={YES_OR_NO}
          blank="Not given"
        />
      </div>
      <MeasuredField
        field={parts.tapeTemperatureLimit}
        label="Highest temperature of the tape"
        dimension="temperature"
        toleranceDimension="temperatureDifference"
        example="80 °C"
        hint="Blank: the site’s limit for tape"
      />
      <MeasuredField
        field={parts.tapeEmbeddingDepth}
        label="Soft layer that takes up bumps"
        dimension="length"
        example="200 um"
        hint="0 um when it has none"
      />
      <MeasuredField
        field={parts.tapeThicknessVariation}
        label="Thickness variation of the tape"
        dimension="length"
        example="3 um"
      />
      <MeasuredField
        field={parts.tapeLongestTime}
        label="Longest time on the tape"
        dimension="time"
        example="7 d"
        hint="Blank: the site’s red line"
      />
      <fieldset className="border-t border-line pt-3">
        <legend className="float-left mb-2 w-full font-semibold">What the tape stands</legend>
        <div className="clear-both grid grid-cols-2 gap-3 tablet:grid-cols-3 wide:grid-cols-6">
          {STANDS.map(([name, label]) => (
            <ChoiceField
              key={name}
              field={parts[name]}
              label={label}
              choices={sameWords(RESISTANCE_WORDS)}
              blank="Not given"
            />
          ))}
        </div>
      </fieldset>
    </>
  );
}
