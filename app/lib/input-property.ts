import { BONDING_MATERIAL_PROPERTIES } from "#app/components/carriers/bonding-material-properties.ts";
import { CARRIER_PROPERTIES } from "#app/components/carriers/carrier-properties.ts";
import { TAPE_PROPERTIES } from "#app/components/carriers/tape-properties.ts";
import { TOOL_PROPERTIES } from "#app/components/carriers/tool-properties.ts";
import { FILM_PROPERTIES } from "#app/components/films/film-properties.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { SIDE_NAMES } from "#app/engine/vocabulary.ts";
import type { InputRecord } from "#app/schemas/assessment-changes.ts";
import { formatMeasured } from "./format-measured.ts";

/** How a property of an input is called and shown. */
export interface InputProperty {
  label: string;
  dimension?: Dimension;
  unit?: string;
  sign?: boolean;
}

/** What the library's own tables do not name, by the name of the property in the engine's input. */
const OTHER: Record<string, InputProperty> = {
  title: { label: "Name" },
  kind: { label: "Kind" },
  peakTemperature: { label: "Peak temperature", dimension: "temperature", unit: "°C" },
  holdTime: { label: "Time at peak", dimension: "time", unit: "min" },
  time: { label: "Time", dimension: "time", unit: "min" },
  temperature: { label: "Temperature", dimension: "temperature", unit: "°C" },
  profile: { label: "Temperature profile" },
  sideUp: { label: "Side up" },
  machine: { label: "Machine" },
  recipe: { label: "Recipe" },
  identity: { label: "Piece" },
  uses: { label: "Uses so far" },
  outOfUse: { label: "Out of use" },
  equipment: { label: "Tool" },
  exposures: { label: "Exposed to" },
  planned: { label: "Support planned" },
  siliconAfter: { label: "Silicon after it", dimension: "length", unit: "µm" },
  groundFaceForce: { label: "Ground face force", dimension: "forcePerLength", unit: "N/m", sign: true },
  stress: { label: "Stress at 25\u00A0°C", dimension: "stress", unit: "MPa", sign: true },
  thickness: { label: "Thickness", dimension: "length", unit: "µm" },
  coverage: { label: "Area coverage", dimension: "fraction", unit: "%" },
  side: { label: "Side" },
  edgeTrim: { label: "Edge trim" },
  width: { label: "Trim width", dimension: "length", unit: "mm" },
  depth: { label: "Trim depth", dimension: "length", unit: "µm" },
  bond: { label: "Bond" },
  face: { label: "Face" },
  debondFace: { label: "Face that is let go" },
  carrier: { label: "Carrier" },
  material: { label: "Material" },
  film: { label: "Film" },
  adds: { label: "Adds" },
  removes: { label: "Takes off" },
  diameter: { label: "Diameter", dimension: "length", unit: "mm" },
  orientation: { label: "Face" },
  flows: { label: "Flows when hot" },
  release: { label: "Release" },
  atPeak: { label: "When hot" },
  name: { label: "Name" },
  incoming: { label: "Incoming shape" },
  x: { label: "Incoming curvature along the notch", dimension: "curvature", unit: "1/m", sign: true },
  y: { label: "Incoming curvature across the notch", dimension: "curvature", unit: "1/m", sign: true },
  leastThickness: { label: "Thinnest bond it is made for", dimension: "length", unit: "µm" },
  mostThickness: { label: "Thickest bond it is made for", dimension: "length", unit: "µm" },
  filmShare: { label: "Film part of the incoming shape", dimension: "fraction", unit: "%" },
  expansionCurve: { label: "Expansion over temperature" },
  meanExpansionOver: { label: "Expansion is a mean over" },
  from: { label: "Expansion is a mean from", dimension: "temperature", unit: "°C" },
  to: { label: "Expansion is a mean to", dimension: "temperature", unit: "°C" },
};

const TABLES: Partial<Record<InputRecord, Record<string, InputProperty>>> = {
  film: FILM_PROPERTIES,
  carrier: CARRIER_PROPERTIES,
  bondingMaterial: BONDING_MATERIAL_PROPERTIES,
  tape: TAPE_PROPERTIES,
  equipment: TOOL_PROPERTIES,
};

/** The described properties of a kind of library record, in the order of its own table. */
export function describedProperties(kind: InputRecord): [name: string, property: InputProperty][] {
  return Object.entries(TABLES[kind] ?? {});
}

/** The words for a property of a record; one that nobody has described is called by its own name, in words. */
export function inputProperty(kind: InputRecord, name: string): InputProperty {
  return TABLES[kind]?.[name] ?? OTHER[name] ?? { label: inWords(name) };
}

/** 'leastThickness' as 'Least thickness'. */
function inWords(name: string): string {
  const words = name.replace(/([a-z])([A-Z0-9])/g, "$1 $2").toLowerCase();
  return words.charAt(0).toUpperCase() + words.slice(1);
}

export const NONE = "none";

/** Whether a value is a property that somebody stated. */
export function isMeasured(value: unknown): value is Measured {
  return isObject(value) && typeof value["value"] === "number" && "source" in value && "tolerance" in value;
}

export const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value);

/** Digits that tell two values apart that look the same when rounded. */
const EXACT = 9;

/** Two values of one property as texts that differ: the unit always, the source where that is what changed. */
export function changeTexts(before: unknown, after: unknown, property: InputProperty): { from: string; to: string } {
  const texts = { from: valueText(before, property), to: valueText(after, property) };
  if (isMeasured(before) && isMeasured(after) && before.source !== after.source)
    return { from: `${texts.from}, ${before.source}`, to: `${texts.to}, ${after.source}` };
  if (texts.from !== texts.to) return texts;
  if (isMeasured(before) && isMeasured(after)) {
    if (before.value !== after.value || before.tolerance !== after.tolerance)
      return { from: exactText(before, property), to: exactText(after, property) };
    return { from: `${texts.from}, ${saidOf(before)}`, to: `${texts.to}, ${saidOf(after)}` };
  }
  if (typeof before === "number" && typeof after === "number")
    return { from: numberText(before, property, EXACT), to: numberText(after, property, EXACT) };
  return texts;
}

/** What was said of where a value comes from, besides its source. */
const saidOf = ({ note, on }: Measured) => [note, on].filter(Boolean).join(", ") || "nothing said of it";

function exactText(measured: Measured, property: InputProperty): string {
  const value = numberText(measured.value, property, EXACT);
  if (measured.tolerance === null) return `${value}, no tolerance`;
  const { dimension } = property;
  const step = {
    ...property,
    sign: false,
    dimension: dimension === "temperature" ? "temperatureDifference" : dimension,
  };
  return `${value}, tolerance ${numberText(measured.tolerance, { ...step, unit: stepUnit(property) } as InputProperty, EXACT)}`;
}

const stepUnit = ({ dimension, unit }: InputProperty) => (dimension === "temperature" ? "K" : unit);

/** A value of an input in words, with its unit. */
export function valueText(value: unknown, property: InputProperty): string {
  if (value === null || value === undefined || value === "") return NONE;
  if (isMeasured(value))
    return property.dimension
      ? formatMeasured(value, property.dimension, { unit: property.unit ?? "", sign: property.sign })
      : formatNumber(value.value);
  if (typeof value === "number") return numberText(value, property);
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (Array.isArray(value))
    return value.length === 0 ? NONE : value.map((each) => valueText(each, property)).join(", ");
  if (isObject(value)) return objectText(value);
  return value === "front" || value === "back" ? SIDE_NAMES[value] : String(value);
}

function numberText(value: number, { dimension, unit, sign }: InputProperty, significant?: number): string {
  const style = significant === undefined ? { sign } : { sign, significant, trim: true };
  return dimension ? formatQuantity(value, dimension, { unit, ...style }) : formatNumber(value, style);
}

/** A thing by its name, else by what it is made of: a film with its thickness and side, a bond with carrier and material. */
function objectText(value: Record<string, unknown>): string {
  if (typeof value["name"] === "string") return value["name"];
  if (typeof value["filmName"] === "string") return `${value["filmName"]}, ${String(value["side"])}`;
  return Object.entries(value)
    .filter(([key, part]) => key !== "id" && part !== null && part !== undefined)
    .map(([key, part]) => valueText(part, inputProperty("flow", key)))
    .join(", ");
}
