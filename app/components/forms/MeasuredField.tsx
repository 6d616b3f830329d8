import { getInputProps, type FieldMetadata } from "@conform-to/react";
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
  /** asks for the day of the measurement too; without it a day that is known is kept as it is */
  dated?: boolean;
}

/** A property with its tolerance and where it comes from: one row on a wide screen. */
export function MeasuredField({ field, label, dimension, toleranceDimension, example, hint, dated = false }: Props) {
  const parts = field.getFieldset();
  return (
    <fieldset className="border-t border-line pt-3">
      <legend className="float-left mb-2 w-full font-semibold">{label}</legend>
      <div
        className={`clear-both grid gap-3 ${dated ? "grid-cols-2 tablet:grid-cols-[4fr_4fr_4fr_4fr_7fr]" : "tablet:grid-cols-[1fr_1fr_1fr_2fr]"}`}
      >
        <QuantityField field={parts.value} label="Value" dimension={dimension} example={example} hint={hint} />
        <QuantityField
          field={parts.tolerance}
          label="Tolerance, ±"
          dimension={toleranceDimension ?? dimension}
          hint="Half-width; blank: not known"
        />
        <ChoiceField field={parts.source} label="Source" choices={sameWords(SOURCE_KINDS)} blank="Choose" />
        {dated ? (
          <LineField
            field={parts.on}
            label="Measured on"
            input={{ placeholder: "year-month-day", autoComplete: "off" }}
          />
        ) : (
          <input {...getInputProps(parts.on, { type: "hidden" })} key={parts.on.key} />
        )}
        <LineField
          field={parts.note}
          label="Where exactly, or why"
          className={dated ? "max-tablet:col-span-2" : undefined}
        />
      </div>
    </fieldset>
  );
}
