import type { Dimension } from "#app/engine/units/dimensions.ts";

/** A measured property of a film in a table: five columns, whose heads begin with `head`. */
export interface MeasuredColumns {
  property: string;
  /** whether it is one of those that only the handling rules ask */
  handling?: true;
  /** in sentences: 'stress' */
  label: string;
  head: string;
  dimension: Dimension;
  /** unit as a quantity is typed, and as a head spells it; both empty for a plain number */
  unit: string;
  spelt: string;
  /** of a temperature's tolerance, which is a difference */
  tolerance?: { dimension: Dimension; unit: string; spelt: string };
}

const KELVIN = { dimension: "temperatureDifference", unit: "K", spelt: "K" } as const;
const temperature = { dimension: "temperature", unit: "°C", spelt: "C", tolerance: KELVIN } as const;

export const MEASURED_COLUMNS: readonly MeasuredColumns[] = [
  { property: "stress", label: "stress", head: "stress", dimension: "stress", unit: "MPa", spelt: "MPa" },
  {
    property: "youngsModulus",
    label: "Young’s modulus",
    head: "youngs_modulus",
    dimension: "stress",
    unit: "GPa",
    spelt: "GPa",
  },
  {
    property: "poissonsRatio",
    label: "Poisson’s ratio",
    head: "poissons_ratio",
    dimension: "number",
    unit: "",
    spelt: "",
  },
  {
    property: "expansion",
    label: "expansion",
    head: "expansion",
    dimension: "expansion",
    unit: "ppm/K",
    spelt: "ppm_per_K",
  },
  {
    property: "yieldStress",
    label: "yield stress",
    head: "yield_stress",
    dimension: "stress",
    unit: "MPa",
    spelt: "MPa",
  },
  {
    property: "zeroStressTemperature",
    label: "zero-stress temperature",
    head: "zero_stress_temperature",
    ...temperature,
  },
  { property: "temperatureLimit", label: "temperature limit", head: "temperature_limit", ...temperature },
  { property: "solderMelting", handling: true, label: "melting of its solder", head: "solder_melting", ...temperature },
];

/** A plain property: a text, a choice or a length. */
export interface PlainColumn {
  property: string;
  handling?: true;
  label: string;
  head: string;
  /** unit of a length, as it is typed; none for texts and choices */
  unit?: string;
}

export const PLAIN_COLUMNS: readonly PlainColumn[] = [
  { property: "name", label: "name", head: "name" },
  { property: "kind", label: "kind", head: "kind" },
  { property: "stressState", label: "state of the stress", head: "stress_state" },
  { property: "stressState", handling: true, label: "stress measured", head: "stress_measured" },
  {
    property: "stressFilmThickness",
    handling: true,
    label: "film thickness when measured",
    head: "stress_film_thickness_um",
    unit: "µm",
  },
  {
    property: "monitorThickness",
    handling: true,
    label: "monitor thickness",
    head: "monitor_thickness_um",
    unit: "µm",
  },
  {
    property: "monitorDiameter",
    handling: true,
    label: "monitor diameter",
    head: "monitor_diameter_mm",
    unit: "mm",
  },
  { property: "note", label: "note", head: "note" },
];

/** A film as far as its columns are concerned: a record, or the values of a form. */
export interface FilmState {
  name: string;
  handling: object;
}

/** A property of a film, or of what only the handling rules ask. */
export function given(film: FilmState, property: string, handling?: true): unknown {
  const from: object = handling ? film.handling : film;
  return (from as Record<string, unknown>)[property] ?? null;
}

const PARTS = ["tolerance", "source", "note", "date"] as const;
export type Part = "value" | (typeof PARTS)[number];

const withUnit = (head: string, spelt: string) => (spelt === "" ? head : `${head}_${spelt}`);

/** Head of a column of a measured property. */
export function headOf(columns: MeasuredColumns, part: Part): string {
  const { head, spelt, tolerance } = columns;
  if (part === "value") return withUnit(head, spelt);
  if (part === "tolerance") return withUnit(`${head}_tolerance`, tolerance?.spelt ?? spelt);
  return `${head}_${part}`;
}

/** Every head, in the order in which a table is written. */
export function allHeads(): string[] {
  const [name, kind, ...others] = PLAIN_COLUMNS.map(({ head }) => head);
  const measured = MEASURED_COLUMNS.flatMap((columns) =>
    (["value", ...PARTS] as const).map((part) => headOf(columns, part)),
  );
  return [name ?? "", kind ?? "", ...measured, ...others];
}
