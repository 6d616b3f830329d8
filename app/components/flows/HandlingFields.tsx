import type { FieldMetadata } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { CONTACT_MEANS } from "#app/engine/flow/handling-inputs.ts";
import type { StepHandlingText } from "./step-handling-values.ts";

export const FACES = [
  { value: "front", label: "Device side" },
  { value: "back", label: "Back side" },
];
export const YES_OR_NO = sameWords(["yes", "no"]);

interface Props {
  field: FieldMetadata<StepHandlingText | undefined>;
  /** something of it is given already, or needs a look */
  open: boolean;
}

/** Contact, clocks and bumps of a step, folded away until they are wanted: any kind of step may have them, few do. */
export function HandlingFields({ field, open }: Props) {
  const parts = field.getFieldset();
  return (
    <details className="border-t border-ink pt-4" open={open}>
      <summary className="cursor-pointer font-semibold">
        Contact, clocks and bumps
        <span className="ml-2 font-normal text-quiet">
          What is left blank is missing: a rule that needs it says so.
        </span>
      </summary>
      <div className="mt-3 space-y-3">
        <div className="grid gap-3 tablet:grid-cols-4">
          <ChoiceField field={parts.contactFace} label="Face that is touched" choices={FACES} blank="Not given" />
          <ChoiceField
            field={parts.contactMeans}
            label="Touched with"
            choices={sameWords(CONTACT_MEANS)}
            blank="Not given"
          />
          <QuantityField
            field={parts.timeSincePrevious}
            label="Time since the step before"
            dimension="time"
            example="4 h"
            hint="Longest that it waits"
          />
          <ChoiceField
            field={parts.inLine}
            label="In line from the step before"
            choices={YES_OR_NO}
            blank="Not given"
            hint="Never free in between"
          />
        </div>
        <MeasuredField
          field={parts.bumpHeight}
          label="Bumps on the device side from this step on: height over the face, tallest"
          dimension="length"
          example="130 um"
        />
        <MeasuredField
          field={parts.bumpPeelForce}
          label="Peel force per width that they stood in a trial"
          dimension="forcePerLength"
          example="40 N/m"
        />
        <MeasuredField
          field={parts.topography}
          label="Tallest other feature of the device side from this step on"
          dimension="length"
          example="4 um"
        />
      </div>
    </details>
  );
}
