import type { FieldMetadata } from "@conform-to/react";
import { MeasuredField, type MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { toleranceOf, type PropertyDescription } from "./property.ts";

/** The form fields of a described property: value, tolerance, source, date and note. */
export function PropertyField({
  field,
  of: property,
}: {
  field: FieldMetadata<MeasuredText | undefined>;
  of: PropertyDescription;
}) {
  return (
    <MeasuredField
      field={field}
      label={property.ask ?? property.label}
      dimension={property.dimension}
      toleranceDimension={toleranceOf(property).dimension}
      example={property.example}
      hint={property.hint}
      dated
    />
  );
}
