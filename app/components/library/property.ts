import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import type { Property } from "#app/components/ui/PropertyTable.tsx";
import { measuredText } from "#app/lib/form-values.ts";

/** A measured property of a kind of record: how it is called, shown and asked for. */
export interface PropertyDescription {
  label: string;
  dimension: Dimension;
  /** unit that it is shown in */
  unit: string;
  /** shows the plus of a positive value too */
  sign?: boolean;
  /** label in the form, where more is to be said than in the table */
  ask?: string;
  example: string;
  /** what leaving it blank means, below its field */
  hint?: string;
  /** what it means that none is given, in the table */
  missing?: string;
}

export type PropertyDescriptions<Name extends string> = Readonly<Record<Name, PropertyDescription>>;

/** A tolerance of a temperature is a difference; of everything else it has the value's own dimension. */
export function toleranceOf({ dimension, unit }: PropertyDescription): { dimension: Dimension; unit: string } {
  return dimension === "temperature" ? { dimension: "temperatureDifference", unit: "K" } : { dimension, unit };
}

const entries = <Name extends string>(described: PropertyDescriptions<Name>) =>
  Object.entries(described) as [Name, PropertyDescription][];

/** The measured properties of a record as the text of their form fields. */
export function measuredTexts<Name extends string>(
  record: Record<NoInfer<Name>, Measured | null>,
  described: PropertyDescriptions<Name>,
): Record<Name, MeasuredText> {
  const texts = entries(described).map(([name, property]) => {
    const tolerance = toleranceOf(property);
    const text = measuredText(record[name], property.dimension, {
      unit: property.unit,
      toleranceDimension: tolerance.dimension,
      toleranceUnit: tolerance.unit,
    });
    return [name, text];
  });
  return Object.fromEntries(texts) as Record<Name, MeasuredText>;
}

/** The rows of those that are given, of properties that few records have. */
export function givenRows<Name extends string>(
  record: Record<NoInfer<Name>, Measured | null>,
  described: PropertyDescriptions<Name>,
): Property[] {
  return propertyRows(record, described).filter(({ measured }) => measured !== null);
}

/** What none is given of, in the words of the table: 'peel force, bend radius at the peel front'; empty when all are. */
export function notGiven<Name extends string>(
  record: Record<NoInfer<Name>, Measured | null>,
  described: PropertyDescriptions<Name>,
): string[] {
  return entries(described).flatMap(([name, { label }]) =>
    record[name] === null ? [label.charAt(0).toLowerCase() + label.slice(1)] : [],
  );
}

/** The measured properties of a record as rows of its property table, in the order of their descriptions. */
export function propertyRows<Name extends string>(
  record: Record<NoInfer<Name>, Measured | null>,
  described: PropertyDescriptions<Name>,
): Property[] {
  return entries(described).map(([name, { label, dimension, unit, sign, missing }]) => ({
    label,
    measured: record[name],
    dimension,
    unit,
    sign,
    missing,
  }));
}
