import type { Dimension } from "#app/engine/units/dimensions.ts";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";

/** A range of the trade: outside it a value is refused as a slip of the keyboard, not judged. */
export interface PhysicalRange {
  /** SI, inclusive */
  least: number;
  most: number;
  /** the same in words: '1 nm to 10 mm' */
  words: string;
}

export interface QuantityRule {
  /** how the field is called in a sentence: 'thickness' */
  label: string;
  dimension: Dimension;
  range: PhysicalRange;
}

/** A quantity as it was typed: understood, or what is wrong with it in one sentence. */
export type ReadQuantity =
  { ok: true; value: number; understood: string } | { ok: false; blank: boolean; message: string };

/** What a quantity that must be given is told when it is blank. */
export const blankMessage = ({ label }: Pick<QuantityRule, "label">) =>
  `Type the ${label}. Blank is missing, not zero.`;

/** Reads one quantity. The same on the server and while it is being typed, so both say the same. */
export function readQuantity(typed: string | undefined, { label, dimension, range }: QuantityRule): ReadQuantity {
  const parsed = parseQuantity(typed ?? "", dimension);
  if (!parsed.ok)
    return parsed.code === "blank"
      ? { ok: false, blank: true, message: blankMessage({ label }) }
      : { ok: false, blank: false, message: parsed.message };
  if (parsed.value < range.least || parsed.value > range.most)
    return { ok: false, blank: false, message: `${parsed.understood} is outside ${range.words}.` };
  return { ok: true, value: parsed.value, understood: parsed.understood };
}

/** The rule for the half-width that belongs to a quantity; `dimension` when it differs from the quantity's own. */
export function toleranceRule({ dimension, range }: QuantityRule, own: Dimension = dimension): QuantityRule {
  const most = range.most - range.least;
  return { label: "tolerance", dimension: own, range: { least: 0, most, words: "zero to the width of the range" } };
}
