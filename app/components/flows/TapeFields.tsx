import type { FieldMetadata } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { RESISTANCE_WORDS } from "#app/engine/flow/handling-inputs.ts";
import { YES_OR_NO } from "./HandlingFields.tsx";
import type { StepHandlingText } from "./step-handling-values.ts";

const LIBRARYS = "Blank: the library’s";

const STANDS = [
  ["tapeVacuum", "Vacuum"],
  ["tapePlasma", "Plasma"],
  ["tapeSolvent", "Solvent"],
  ["tapeAcid", "Acid"],
  ["tapeBase", "Base"],
  ["tapeUltraviolet", "Ultraviolet light"],
] as const;

interface Props {
  field: FieldMetadata<StepHandlingText | undefined>;
  /** name of the tape of the library that is chosen; null for none */
  chosen: string | null;
}

/** What a step itself states of the tape that it puts the wafer on: it counts before what the library says. */
export function TapeFields({ field, chosen }: Props) {
  const parts = field.getFieldset();
  return (
    <>
      {chosen && (
        <p className="text-quiet">
          {chosen} brings its own values. What is typed here counts before them, at this step alone.
        </p>
      )}
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField
          field={parts.tapeName}
          label={chosen ? "Called here" : "Tape"}
          hint={chosen ? "Blank: as the library calls it" : "By its type, as the floor calls it"}
        />
        <ChoiceField
          field={parts.tapeReleasesInLight}
          label="Ultraviolet light lets it go"
          choices={YES_OR_NO}
          blank={chosen ? "As the library says" : "Not given"}
        />
      </div>
      <MeasuredField
        field={parts.tapeTemperatureLimit}
        label="Highest temperature of the tape"
        dimension="temperature"
        toleranceDimension="temperatureDifference"
        example="80 °C"
        hint={chosen ? LIBRARYS : "Blank: the site’s limit for tape"}
      />
      <MeasuredField
        field={parts.tapeEmbeddingDepth}
        label="Soft layer that takes up bumps"
        dimension="length"
        example="200 um"
        hint={chosen ? `0 um when it has none. ${LIBRARYS}` : "0 um when it has none"}
      />
      <MeasuredField
        field={parts.tapeThicknessVariation}
        label="Thickness variation of the tape"
        dimension="length"
        example="3 um"
        hint={chosen ? LIBRARYS : undefined}
      />
      <MeasuredField
        field={parts.tapeLongestTime}
        label="Longest time on the tape"
        dimension="time"
        example="7 d"
        hint={chosen ? LIBRARYS : "Blank: the site’s red line"}
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
              blank={chosen ? "As the library says" : "Not given"}
            />
          ))}
        </div>
      </fieldset>
    </>
  );
}
