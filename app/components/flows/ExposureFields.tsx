import { getCollectionProps, type FieldMetadata } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SOLVENT_FAMILIES } from "#app/engine/flow/handling-inputs.ts";
import { EXPOSURES, type Exposure } from "#app/engine/vocabulary.ts";
import { exposureKey } from "#app/lib/exposure-key.ts";
import { YES_OR_NO } from "./HandlingFields.tsx";
import type { StepHandlingText } from "./step-handling-values.ts";

/** What shows once its exposure is ticked, in the style sheet, so that it works while scripts are still on their way. */
const TICKED: Record<Exposure, string> = {
  vacuum: "group-has-[input[value=vacuum]:checked]/exposed:block",
  plasma: "group-has-[input[value=plasma]:checked]/exposed:block",
  solvent: "group-has-[input[value=solvent]:checked]/exposed:block",
  acid: "group-has-[input[value=acid]:checked]/exposed:block",
  base: "group-has-[input[value=base]:checked]/exposed:block",
  water: "group-has-[input[value=water]:checked]/exposed:block",
  flux: "group-has-[input[value=flux]:checked]/exposed:block",
  nitrogen: "group-has-[input[value=nitrogen]:checked]/exposed:block",
  "ultraviolet light": "group-has-[input[value='ultraviolet_light']:checked]/exposed:block",
};
const HIDDEN = "hidden noscript:block has-[[aria-invalid]]:block";

interface Props {
  field: FieldMetadata<string[] | undefined>;
  handling: FieldMetadata<StepHandlingText | undefined>;
}

/** What a step exposes the wafer to, and for each how long. */
export function ExposureFields({ field, handling }: Props) {
  const parts = handling.getFieldset();
  const times = parts.exposureTimes.getFieldset();
  return (
    <fieldset className="group/exposed">
      <legend className="mb-1 text-label text-quiet">What it exposes the wafer to</legend>
      <div className="flex flex-wrap gap-x-5">
        {getCollectionProps(field, { type: "checkbox", options: [...EXPOSURES] }).map(({ key, ...input }) => (
          <label key={key} className="flex min-h-8 items-center gap-2">
            <input {...input} key={key} className="size-4 accent-ink" />
            {input.value}
          </label>
        ))}
      </div>
      {field.errors && <p className="text-label text-stop">{field.errors[0]}</p>}
      <div className="mt-2 grid grid-cols-2 gap-3 tablet:grid-cols-4">
        {EXPOSURES.map((exposure) => {
          const time = times[exposureKey(exposure)];
          return (
            time && (
              <div key={exposure} className={`${HIDDEN} ${TICKED[exposure]}`}>
                <QuantityField
                  field={time}
                  label={`Time in ${exposure}`}
                  dimension="time"
                  example="5 min"
                  hint="Blank: as long as the peak, or the whole profile"
                />
              </div>
            )
          );
        })}
        <div className={`${HIDDEN} ${TICKED.solvent}`}>
          <ChoiceField
            field={parts.solvent}
            label="Kind of solvent"
            choices={sameWords(SOLVENT_FAMILIES)}
            blank="Not given"
          />
        </div>
        <div className={`${HIDDEN} ${TICKED.vacuum}`}>
          <ChoiceField
            field={parts.dehydrationBake}
            label="Baked dry before the vacuum"
            choices={YES_OR_NO}
            blank="Not given"
          />
        </div>
      </div>
    </fieldset>
  );
}
