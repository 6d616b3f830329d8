import type { FieldMetadata } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { expansionRowsText, type ExpansionRecord } from "#app/lib/expansion-rows.ts";
import { quantityText } from "#app/lib/form-values.ts";
import { FormGroup } from "./FormGroup.tsx";

/** A curve of expansion as the text of its form. */
export interface ExpansionCurveText {
  rows: string;
  tolerance: string;
  source: string;
  note: string;
  on: string;
}

export function expansionCurveText(curve: ExpansionRecord | null): ExpansionCurveText {
  if (!curve) return { rows: "", tolerance: "", source: "", note: "", on: "" };
  const { tolerance, source, note, on } = curve;
  return {
    rows: expansionRowsText(curve),
    tolerance: quantityText(tolerance, "expansion", "ppm/K"),
    source,
    note,
    on: on ?? "",
  };
}

/** Expansion over temperature as rows to type or paste, with what holds for the whole curve. */
export function ExpansionCurveFields({ field }: { field: FieldMetadata<ExpansionCurveText | undefined> }) {
  const { rows, tolerance, source, note, on } = field.getFieldset();
  return (
    <FormGroup label="Expansion over temperature, where it is known as a curve">
      <div className="grid gap-3 tablet:grid-cols-2">
        <NoteField
          field={rows}
          label="Degrees C and ppm/K, one pair on each line"
          rows={6}
          hint="Such as ‘25; 3.2’. Typed or pasted; blank: the mean above. With both, the curve is moved onto the mean."
        />
        <div className="grid grid-cols-2 gap-3 self-start">
          <QuantityField
            field={tolerance}
            label="Tolerance, ±"
            dimension="expansion"
            example="0.1 ppm/K"
            hint="Half-width of the whole curve; blank: not known"
          />
          <ChoiceField field={source} label="Source" choices={sameWords(SOURCE_KINDS)} blank="Choose" />
          <LineField field={on} label="Measured on" input={{ placeholder: "year-month-day", autoComplete: "off" }} />
          <LineField field={note} label="Where exactly, or why" />
        </div>
      </div>
    </FormGroup>
  );
}
