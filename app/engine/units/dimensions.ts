/** One unit of a dimension. */
export interface UnitDefinition {
  /** The way it is shown. */
  symbol: string;
  /** Ways it may be typed besides `symbol`. Case matters: m and M differ. */
  spellings: readonly string[];
  /** Name in the units package, null for a pure number. */
  base: string | null;
  /** How many of `base` it is. */
  times: number;
}

export interface DimensionDefinition {
  /** In a sentence: 'a unit of length'. */
  name: string;
  /** SI unit by its name in the units package, null for a pure number. */
  si: string | null;
  /** The first two are those that a hint offers. */
  units: readonly UnitDefinition[];
  /** Units to offer when one is not known, as the end of a sentence. */
  use: string;
  /** Lowest value in SI that has a meaning. */
  least?: number;
}

function unit(symbol: string, base: string | null, spellings: readonly string[] = [], times = 1): UnitDefinition {
  return { symbol, spellings, base, times };
}

/** Everything that a quantity can be typed or shown in. */
export const DIMENSIONS = {
  length: {
    name: "length",
    si: "m",
    units: [
      unit("µm", "um", ["um", "micron", "microns", "micrometre", "micrometer"]),
      unit("nm", "nm"),
      unit("mm", "mm"),
      unit("cm", "cm"),
      unit("m", "m"),
      unit("Å", "angstrom", ["angstrom", "Angstrom", "Ang"]),
      unit("kÅ", "angstrom", ["kangstrom"], 1000),
      unit("inch", "inch", ["in", "inches", '"']),
      unit("mil", "mil", ["mils"]),
    ],
    use: "nm, µm, um, mm, Å, inch or mil",
  },
  stress: {
    name: "stress",
    si: "Pa",
    units: [
      unit("MPa", "MPa", ["N/mm2", "N/mm^2", "N/mm²"]),
      unit("GPa", "GPa", ["kN/mm2", "kN/mm^2", "kN/mm²"]),
      unit("Pa", "Pa", ["N/m2", "N/m^2", "N/m²"]),
      unit("kPa", "kPa"),
      unit("dyn/cm²", "dyn/cm^2", [
        "dyn/cm2",
        "dyn/cm^2",
        "dyne/cm2",
        "dyne/cm^2",
        "dyne/cm²",
        "dynes/cm2",
        "dynes/cm^2",
      ]),
      unit("psi", "lbf/in^2"),
      unit("ksi", "lbf/in^2", [], 1000),
      unit("Msi", "lbf/in^2", [], 1e6),
    ],
    use: "Pa, kPa, MPa, GPa, dyn/cm2 or psi",
  },
  temperature: {
    name: "temperature",
    si: "K",
    units: [
      unit("°C", "degC", ["C", "degC", "deg C", "℃", "ºC", "celsius"]),
      unit("K", "K", ["kelvin"]),
      unit("°F", "degF", ["degF", "deg F", "ºF"]),
    ],
    use: "°C, C, degC, °F or K",
    least: 0,
  },
  temperatureDifference: {
    name: "temperature difference",
    si: "K",
    units: [unit("K", "K", ["kelvin"]), unit("°C", "K", ["C", "degC", "deg C", "℃", "ºC"])],
    use: "K or °C",
  },
  expansion: {
    name: "thermal expansion",
    si: "K^-1",
    units: [
      unit("ppm/K", "K^-1", ["ppm/°C", "ppm/C", "ppm/degC", "µm/m/K", "um/m/K"], 1e-6),
      unit("1/K", "K^-1", ["/K", "K^-1", "K-1", "1/°C", "/°C", "1/C", "/C", "1/degC", "/degC"]),
    ],
    use: "ppm/K, ppm/°C or 1/K",
  },
  fraction: {
    name: "fraction",
    si: null,
    units: [unit("%", null, ["percent", "pct"], 0.01), unit("", null)],
    use: "%, or no unit",
  },
  forcePerLength: {
    name: "force per length",
    si: "N/m",
    units: [
      unit("N/m", "N/m"),
      unit("mN/m", "mN/m"),
      unit("kN/m", "kN/m", ["N/mm"]),
      unit("dyn/cm", "dyn/cm", ["dyne/cm"]),
    ],
    use: "N/m, mN/m, kN/m or dyn/cm",
  },
  curvature: {
    name: "curvature",
    si: "m^-1",
    units: [
      unit("1/m", "m^-1", ["/m", "m^-1", "m-1"]),
      unit("1/km", "km^-1", ["/km", "km^-1", "km-1"]),
      unit("1/mm", "mm^-1", ["/mm", "mm^-1", "mm-1"]),
    ],
    use: "1/m, /m or 1/km",
  },
  time: {
    name: "time",
    si: "s",
    units: [
      unit("min", "minute", ["mins", "minute", "minutes"]),
      unit("h", "hour", ["hr", "hrs", "hour", "hours"]),
      unit("s", "s", ["sec", "secs", "second", "seconds"]),
      unit("d", "day", ["day", "days"]),
    ],
    use: "s, min, h or d",
  },
  density: {
    name: "density",
    si: "kg/m^3",
    units: [unit("kg/m³", "kg/m^3", ["kg/m3", "kg/m^3"]), unit("g/cm³", "g/cm^3", ["g/cm3", "g/cm^3", "g/cc"])],
    use: "kg/m3 or g/cm3",
  },
  mass: {
    name: "mass",
    si: "kg",
    units: [unit("g", "g", ["gram", "grams"]), unit("kg", "kg"), unit("mg", "mg")],
    use: "g, kg or mg",
  },
  angle: {
    name: "angle",
    si: "rad",
    units: [unit("°", "deg", ["deg", "degree", "degrees", "º"]), unit("mrad", "mrad"), unit("rad", "rad")],
    use: "°, deg, mrad or rad",
  },
  number: { name: "number", si: null, units: [unit("", null)], use: "no unit" },
} as const satisfies Record<string, DimensionDefinition>;

/** Kind of a quantity. A temperature is a point, a temperature difference a step. */
export type Dimension = keyof typeof DIMENSIONS;

/** The unit that a spelling means in a dimension, or null. */
export function findUnit(dimension: Dimension, spelling: string): UnitDefinition | null {
  const definition: DimensionDefinition = DIMENSIONS[dimension];
  return definition.units.find((u) => u.symbol === spelling || u.spellings.includes(spelling)) ?? null;
}
