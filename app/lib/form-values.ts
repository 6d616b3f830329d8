import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";

/** An SI value as text for an input: short, with a plain blank before the unit. */
export function quantityText(value: number | null | undefined, dimension: Dimension, unit?: string): string {
  if (value === null || value === undefined) return "";
  return formatQuantity(value, dimension, { unit, significant: 12, trim: true }).replaceAll("\u00A0", " ");
}

/** A measured property as the text of its form fields. What somebody typed is shown as they typed it. */
export function measuredText(
  measured: Measured | null | undefined,
  dimension: Dimension,
  options: { unit?: string; toleranceDimension?: Dimension; toleranceUnit?: string } = {},
) {
  if (!measured) return { value: "", tolerance: "", source: "", note: "", on: "" };
  const { toleranceDimension = dimension, toleranceUnit = options.unit } = options;
  return {
    value: measured.text || quantityText(measured.value, dimension, options.unit),
    tolerance: quantityText(measured.tolerance, toleranceDimension, toleranceUnit),
    source: measured.source,
    note: measured.note ?? "",
    on: measured.on ?? "",
  };
}

/** An answer as the value of its choice; nothing when it was not given. */
export const yesOrNoText = (answer: boolean | null): string => (answer === null ? "" : answer ? "yes" : "no");

/** The measured shape that a wafer comes in with; see the flow's own fields. */
export interface IncomingShape {
  incomingBowAlong: Measured | null;
  incomingBowAcross: Measured | null;
  incomingFilmShare: Measured | null;
}

/** That shape as the text of its form fields. */
export function incomingShapeTexts(flow: IncomingShape) {
  return {
    incomingBowAlong: measuredText(flow.incomingBowAlong, "length", { unit: "µm" }),
    incomingBowAcross: measuredText(flow.incomingBowAcross, "length", { unit: "µm" }),
    incomingFilmShare: measuredText(flow.incomingFilmShare, "fraction", { unit: "%" }),
  };
}
