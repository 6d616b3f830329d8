import type { FieldMetadata } from "@conform-to/react";
import { ChoiceField, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";

const ORIENTATIONS: Choice[] = [
  { value: "100", label: "(100)" },
  { value: "111", label: "(111)" },
];

const THICKNESSES: Choice[] = [
  { value: "measured", label: "measured on this wafer" },
  { value: "nominal", label: "nominal, from its box" },
];

type Field =
  | "film"
  | "filmThickness"
  | "filmThicknessTolerance"
  | "siliconThickness"
  | "siliconThicknessTolerance"
  | "siliconThicknessFrom"
  | "sinceCure"
  | "diameter"
  | "orientation";

/** What two scans make a stress with: program, film, thicknesses, wafer. Cells of the grid that they stand in. */
export function SubjectFields({
  fields,
  programs,
  films,
}: {
  fields: Record<Field | "program", FieldMetadata<string>>;
  programs: readonly Choice[];
  films: readonly Choice[];
}) {
  return (
    <>
      <ChoiceField field={fields.program} label="Program" choices={programs} blank="Choose" />
      <MeasuredWaferFields fields={fields} films={films} />
    </>
  );
}

/** The same where the program is settled. */
export function MeasuredWaferFields({
  fields,
  films,
}: {
  fields: Record<Field, FieldMetadata<string>>;
  films: readonly Choice[];
}) {
  return (
    <>
      <ChoiceField
        field={fields.film}
        label="Film, to compare with the library"
        choices={films}
        blank="None of the library"
        className="tablet:col-span-2"
      />
      <QuantityField
        field={fields.filmThickness}
        label="Film thickness"
        dimension="length"
        example="5 µm"
        hint="Of the film between the two scans"
      />
      <QuantityField
        field={fields.filmThicknessTolerance}
        label="Tolerance, ±"
        dimension="length"
        hint="Half-width; blank: not known"
      />
      <QuantityField field={fields.siliconThickness} label="Silicon thickness" dimension="length" example="725 µm" />
      <QuantityField
        field={fields.siliconThicknessTolerance}
        label="Tolerance, ±"
        dimension="length"
        hint="Half-width; blank: not known"
      />
      <ChoiceField
        field={fields.siliconThicknessFrom}
        label="That thickness is"
        choices={THICKNESSES}
        blank="Not said"
        hint="It enters squared"
      />
      <QuantityField
        field={fields.sinceCure}
        label="From cure to scan"
        dimension="time"
        example="26 h"
        hint="Of a film that cures; it moves for a day"
      />
      <QuantityField field={fields.diameter} label="Diameter" dimension="length" example="200 mm" />
      <ChoiceField field={fields.orientation} label="Orientation of the silicon" choices={ORIENTATIONS} />
    </>
  );
}
