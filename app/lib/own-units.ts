import { fromSi, stepFromSi, toSi } from "#app/engine/units/convert.ts";
import { findUnit, type Dimension } from "#app/engine/units/dimensions.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";

export const LENGTH_UNITS = ["µm", "mil"] as const;
export const STRESS_UNITS = ["MPa", "ksi"] as const;
export const TEMPERATURE_UNITS = ["°C", "°F"] as const;

/**
 * The units in which a person reads figures. Lengths from 1 mm on stay in mm, and those in nm stay in nm: wafers are sold and films
 * are deposited in them wherever mil is spoken. A difference of temperatures stays in K, and with it whatever is per K.
 */
export interface OwnUnits {
  length: (typeof LENGTH_UNITS)[number];
  stress: (typeof STRESS_UNITS)[number];
  temperature: (typeof TEMPERATURE_UNITS)[number];
}

/** As delivered, and what is stored, sent, exchanged and printed whoever reads it. */
export const DELIVERED_UNITS: OwnUnits = { length: "µm", stress: "MPa", temperature: "°C" };

/** Whether nothing is to be rewritten. */
export const asDelivered = (units: OwnUnits) =>
  units.length === "µm" && units.stress === "MPa" && units.temperature === "°C";

/** A unit and the one that a person reads instead of it. */
export interface UnitChange {
  dimension: Dimension;
  from: string;
  to: string;
}

/** Units that may be rewritten, each by whose choice and with what stands for it. Moduli go with stresses: beside ksi nobody reads GPa. */
const CHANGES: readonly (UnitChange & { chosen: OwnUnits[keyof OwnUnits] })[] = [
  { chosen: "mil", dimension: "length", from: "µm", to: "mil" },
  { chosen: "ksi", dimension: "stress", from: "MPa", to: "ksi" },
  { chosen: "ksi", dimension: "stress", from: "GPa", to: "Msi" },
  { chosen: "ksi", dimension: "stress", from: "kPa", to: "psi" },
  { chosen: "°F", dimension: "temperature", from: "°C", to: "°F" },
];

/** What becomes of a unit, by its symbol as delivered; null where it stays. */
export function changeOf(symbol: string, { length, stress, temperature }: OwnUnits): UnitChange | null {
  const choices: string[] = [length, stress, temperature];
  return CHANGES.find(({ from, chosen }) => from === symbol && choices.includes(chosen)) ?? null;
}

/** A unit's symbol, or what stands under the head of a column, such as 'µm, k = 2', in the person's units. */
export function ownHead(head: string, units: OwnUnits): string {
  const [, symbol = "", rest = ""] = /^(\S+?)(,.*)?$/s.exec(head) ?? [];
  const change = changeOf(symbol, units);
  return change ? `${change.to}${inOwnUnits(rest, units)}` : inOwnUnits(head, units);
}

/** Figures are shown to this many digits at least, where nothing beside them says how well they are known. */
const LEAST_DIGITS = 3;

const NUMBER = "[−-]?\\+?(?:\\d{1,3}(?:,\\d{3})+|\\d+)(?:\\.\\d+)?";
const GAP = "[ \\u00A0]";
const SPREAD = `(?:(${GAP}?±${GAP}?)(${NUMBER}))?`;
/** Words that make a number the name of something, so that 'step 12 to 50 µm' is no range. */
const NAMED =
  "(?<!\\b(?:steps?|slots?|wafers?|films?|points?|rules?|runs?|rows?|pieces?|legs?|lots?|revision)[ \\u00A0])";
/** A number that another figure does not go on into: not the end of 1.5, of x10 or of A3. */
const BEFORE = "(?<![\\w.,^⁻·×])";
const UNITS = CHANGES.map(({ from }) => from).join("|");
/** What makes the unit another one: µm/m, °C/min, µm², MPa·m. */
const AFTER = "(?![\\wµ²³⁰-⁹·/^])";

/**
 * A quantity as `formatQuantity` and its fellows write it: number, ± number, 'to' number, no-break space, unit. The no-break space is
 * what tells it from what somebody typed, which is never rewritten.
 */
const QUANTITY = new RegExp(
  `(±${GAP}?)?${BEFORE}(?:${NAMED}(${NUMBER})( to |–))?(${NUMBER})${SPREAD}\\u00A0(${UNITS})${AFTER}`,
  "gu",
);

/** Whether a text holds anything that may be rewritten; quick, since every text of a page is asked. */
export function holdsQuantity(text: string): boolean {
  return text.includes("\u00A0") && /\u00A0(?:µm|[MGk]Pa|°C)/.test(text);
}

/**
 * A text with every quantity in it in the person's units. Each figure keeps its precision: its last place is the largest power of ten
 * that is not coarser than the last place shown, so that it leads back to the same figure; one that stands alone has three digits at
 * least. What follows ± is a difference, also of temperatures. A text that has been rewritten once stays as it is.
 */
export function inOwnUnits(text: string, units: OwnUnits): string {
  if (asDelivered(units) || !holdsQuantity(text)) return text;
  return text.replace(
    QUANTITY,
    (
      whole: string,
      alone: string | undefined,
      first: string | undefined,
      to: string | undefined,
      number: string,
      sign: string | undefined,
      spread: string | undefined,
      symbol: string,
    ) => {
      const change = changeOf(symbol, units);
      if (!change) return whole;
      const figure = alone
        ? `${alone}${rewritten(number, change, { step: true })}`
        : withSpread(number, sign, spread, change);
      const range = first === undefined ? "" : `${rewritten(first, change)}${to}`;
      return `${range}${figure}\u00A0${change.to}`;
    },
  );
}

const BARE = new RegExp(`${BEFORE}(${NUMBER})${SPREAD}(?![\\w.]|\\u00A0(?!±|to\\b))`, "gu");

/** Figures that stand without their unit, because the head of their column names it: '343 ± 120', '10 to 40'. Others have their own. */
export function bareInOwnUnits(text: string, symbol: string, units: OwnUnits): string {
  const change = changeOf(symbol, units);
  if (!change) return text;
  return text.replace(BARE, (_, number: string, sign: string | undefined, spread: string | undefined) =>
    withSpread(number, sign, spread, change),
  );
}

/** A figure with its ±; both to the same place where there are both. */
function withSpread(number: string, sign: string | undefined, spread: string | undefined, change: UnitChange): string {
  if (spread === undefined) return rewritten(number, change);
  const place = Math.max(decimalsOf(number), decimalsOf(spread));
  const style = { exactly: true, place };
  return `${rewritten(number, change, style)}${sign}${rewritten(spread, change, { ...style, step: true })}`;
}

interface Style {
  /** a difference, which has no offset */
  step?: boolean;
  /** no more digits than its last place asks for */
  exactly?: boolean;
  /** decimals of its last place, where another figure beside it says so */
  place?: number;
}

function rewritten(shown: string, { dimension, from, to }: UnitChange, style: Style = {}): string {
  const { step = false, exactly = false, place = decimalsOf(shown) } = style;
  const [source, target] = [unitOf(dimension, from), unitOf(dimension, to)];
  const value = Number(shown.replace("−", "-").replace(/,/g, ""));
  const scale = stepFromSi(1, target, dimension) / stepFromSi(1, source, dimension);
  const own = step ? value * scale : fromSi(toSi(value, source, dimension), target, dimension);
  const last = decimalsFor(10 ** -place * scale);
  // The zero of degrees is no beginning to count digits from: whole ones stay whole.
  const least = own === 0 || exactly || dimension === "temperature" ? 0 : LEAST_DIGITS - 1 - magnitude(own);
  const decimals = own === 0 && place === 0 && !exactly ? 0 : Math.max(0, last, least);
  return formatNumber(own, { decimals, sign: shown.startsWith("+") });
}

const magnitude = (value: number) => Math.floor(Math.log10(Math.abs(value)));

/** Decimals of the largest power of ten that is not coarser than a step. */
const decimalsFor = (step: number) => Math.ceil(-Math.log10(step) - 1e-9);

const decimalsOf = (shown: string) => /\.(\d+)$/.exec(shown)?.[1]?.length ?? 0;

function unitOf(dimension: Dimension, symbol: string) {
  const unit = findUnit(dimension, symbol);
  if (!unit) throw new RangeError(`${symbol} is not a unit of ${dimension}`);
  return unit;
}

/** A value of a unit as delivered, in the person's; the unit itself where it stays. */
export function ownValue(value: number, symbol: string, units: OwnUnits): number {
  const change = changeOf(symbol, units);
  if (!change) return value;
  const { dimension, from, to } = change;
  return fromSi(toSi(value, unitOf(dimension, from), dimension), unitOf(dimension, to), dimension);
}

/** A scale in the person's unit, for what is drawn: axes, contours. */
export interface OwnScale {
  symbol: string;
  /** SI to the person's unit, and back */
  of: (si: number) => number;
  si: (value: number) => number;
  /** the same for a difference */
  step: (si: number) => number;
}

/** The scale that stands for a unit as delivered; null where it stays. */
export function ownScale(symbol: string, units: OwnUnits): OwnScale | null {
  const change = changeOf(symbol, units);
  if (!change) return null;
  const { dimension, to } = change;
  const unit = unitOf(dimension, to);
  return {
    symbol: to,
    of: (si) => fromSi(si, unit, dimension),
    si: (value) => toSi(value, unit, dimension),
    step: (si) => stepFromSi(si, unit, dimension),
  };
}
