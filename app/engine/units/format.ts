import { EngineInputError } from "../errors.ts";
import { requireFinite, requireWithin } from "../inputs.ts";
import { fromSi, stepFromSi } from "./convert.ts";
import { DIMENSIONS, findUnit, type Dimension, type DimensionDefinition, type UnitDefinition } from "./dimensions.ts";
import { formatNumber, type NumberStyle } from "./format-number.ts";

const NO_BREAK_SPACE = "\u00A0";

export interface QuantityStyle extends NumberStyle {
  /** Symbol or spelling of the unit. Default: one that suits the value. */
  unit?: string;
}

/**
 * An SI value as text with its unit, joined by a no-break space, with the true minus sign and never a negative zero.
 * Throws `EngineInputError` for a value that is not finite or a unit of another dimension.
 */
export function formatQuantity(value: number, dimension: Dimension, style: QuantityStyle = {}): string {
  const unit = chosenUnit(requireFinite("value", value), dimension, style.unit);
  return showQuantity(fromSi(value, unit, dimension), unit.symbol, style);
}

/**
 * An SI value with an uncertainty, such as '157.9 ± 5.0 MPa': the uncertainty to two significant digits, the value to the
 * same decimal place. A temperature's uncertainty is a difference. Whether the uncertainty is a standard or an expanded one
 * is for the caller to say beside it. Source: JCGM 100:2008, 7.2.6.
 */
export function formatWithUncertainty(
  value: number,
  uncertainty: number,
  dimension: Dimension,
  style: { unit?: string; sign?: boolean } = {},
): string {
  requireFinite("value", value);
  requireWithin("uncertainty", uncertainty, 0, Number.MAX_VALUE, "1");
  const unit = chosenUnit(Math.max(Math.abs(value), uncertainty), dimension, style.unit);
  const shown = fromSi(value, unit, dimension);
  const spread = stepFromSi(uncertainty, unit, dimension);
  if (spread === 0) return showQuantity(shown, unit.symbol, { sign: style.sign });
  // The power of ten of the rounded uncertainty: 0.0996 becomes 0.10 and is matched as that.
  const [, power = "0"] = spread.toExponential(1).split("e");
  const decimals = 1 - Number(power);
  const both = `${formatNumber(shown, { decimals, sign: style.sign })} ± ${formatNumber(spread, { decimals })}`;
  return withUnit(both, unit.symbol);
}

/** A number and a unit's symbol as they stand together. */
export function showQuantity(number: number, symbol: string, style: NumberStyle): string {
  return withUnit(formatNumber(number, style), symbol);
}

function withUnit(number: string, symbol: string): string {
  if (symbol === "") return number;
  return symbol === "°" ? `${number}°` : `${number}${NO_BREAK_SPACE}${symbol}`;
}

function chosenUnit(value: number, dimension: Dimension, wanted: string | undefined): UnitDefinition {
  const { name, units }: DimensionDefinition = DIMENSIONS[dimension];
  const unit = findUnit(dimension, wanted ?? suitable(Math.abs(value), dimension));
  if (unit) return unit;
  throw new EngineInputError("unit", `'${wanted}' is not a unit of ${name}`, units.map((u) => u.symbol).join(", "));
}

/** From which size on, in SI, a unit suits; the last one that does is taken. Rounding to four digits moves up as well. */
const LADDERS: Partial<Record<Dimension, readonly (readonly [from: number, symbol: string])[]>> = {
  length: [
    [0, "nm"],
    [1e-6, "µm"],
    [1e-3, "mm"],
    [1, "m"],
  ],
  stress: [
    [0, "Pa"],
    [1e3, "kPa"],
    [1e6, "MPa"],
    [1e9, "GPa"],
  ],
  time: [
    [0, "s"],
    [60, "min"],
    [3600, "h"],
    [86400, "d"],
  ],
};

/** The unit that suits a size, else the dimension's first. */
function suitable(size: number, dimension: Dimension): string {
  const usual = DIMENSIONS[dimension].units[0].symbol;
  if (size === 0) return usual;
  const fitting = LADDERS[dimension]?.filter(([from]) => size * 1.00005 >= from);
  return fitting?.at(-1)?.[1] ?? usual;
}
