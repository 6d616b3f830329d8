import type { FieldMetadata } from "@conform-to/react";
import type { ReactNode } from "react";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { ChoiceField, sameWords } from "./ChoiceField.tsx";
import { LineField } from "./LineField.tsx";
import { QuantityField } from "./QuantityField.tsx";

/** Text of a measured property in a form. */
export interface MeasuredText {
  value?: string | undefined;
  tolerance?: string | undefined;
  source?: string | undefined;
  note?: string | undefined;
  on?: string | undefined;
}

interface Props {
  field: FieldMetadata<MeasuredText | undefined>;
  label: string;
  dimension: Dimension;
  toleranceDimension?: Dimension;
  example?: string;
  hint?: ReactNode;
}

/** A property with its tolerance and where it comes from: one row on a wide screen. */
export function MeasuredField({ field, label, dimension, toleranceDimension, example, hint }: Props) {
  const parts = field.getFieldset();
  return (
    <fieldset className="border-t border-line pt-3">
      <legend className="float-left mb-2 w-full font-semibold">{label}</legend>
      <div className="clear-both grid gap-3 tablet:grid-cols-[1fr_1fr_1fr_2fr]">
        <QuantityField field={parts.value} label="Value" dimension={dimension} example={example} hint={hint} />
        <QuantityField
          field={parts.tolerance}
          label="Tolerance, ±"
          dimension={toleranceDimension ?? dimension}
          hint="Half-width; blank: not known"
        />
        <ChoiceField field={parts.source} label="Source" choices={sameWords(SOURCE_KINDS)} blank="Choose" />
        <LineField field={parts.note} label="Where exactly, or why" />
      </div>
    </fieldset>
  );
}
