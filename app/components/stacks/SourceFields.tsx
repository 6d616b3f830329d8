import { getInputProps, type FieldMetadata } from "@conform-to/react";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";

interface Props {
  parts: ReturnType<FieldMetadata<MeasuredText>["getFieldset"]>;
  /** whose source it is */
  of: string;
}

/** Where a value comes from, with the note and the date that it keeps; cells of a grid of two columns. */
export function SourceFields({ parts, of }: Props) {
  return (
    <>
      <ChoiceField
        field={parts.source}
        label={`Source of the ${of}`}
        choices={sameWords(SOURCE_KINDS)}
        blank="Not said: assumed"
      />
      <LineField field={parts.note} label="Where exactly, or why" className="col-span-full" />
      <input {...getInputProps(parts.on, { type: "hidden" })} key={parts.on.key} />
    </>
  );
}
