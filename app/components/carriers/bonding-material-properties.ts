import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured properties of a bonding material, in the order of its table and form. */
export const BONDING_MATERIAL_PROPERTIES = {
  softening: {
    label: "Softening point",
    ask: "Softening point, as its data sheet gives it",
    dimension: "temperature",
    unit: "°C",
    example: "120 °C",
    hint: "Blank: none in the range used",
    missing: "none in the range used",
  },
  glassTransition: {
    label: "Glass transition",
    ask: "Glass transition, where it turns to a rubber",
    dimension: "temperature",
    unit: "°C",
    example: "105 °C",
    hint: "Blank: its softening point",
    missing: "taken as the softening point",
  },
  flowPoint: {
    label: "Flow point",
    ask: "Flow point of a thermoplastic, from where on the plates slide",
    dimension: "temperature",
    unit: "°C",
    example: "150 °C",
    hint: "Blank: not known, taken not to slide",
    missing: "not given: taken not to slide",
  },
  temperatureLimit: {
    label: "Temperature limit",
    ask: "Highest temperature it may see while bonded",
    dimension: "temperature",
    unit: "°C",
    example: "200 °C",
  },
  bondTemperature: { label: "Bond temperature", dimension: "temperature", unit: "°C", example: "180 °C" },
  releaseTemperature: { label: "Release temperature", dimension: "temperature", unit: "°C", example: "200 °C" },
  effectiveModulus: {
    label: "Locked-in modulus",
    ask: "Locked-in modulus, which couples the pair: calibrated on measured pairs, far below the data sheet’s",
    dimension: "stress",
    unit: "MPa",
    example: "150 MPa",
  },
  dataSheetModulus: {
    label: "Modulus of the data sheet",
    ask: "Modulus of the data sheet, for comparison only",
    dimension: "stress",
    unit: "MPa",
    example: "1.6 GPa",
    hint: "Blank: not known",
  },
  poissonsRatio: { label: "Poisson’s ratio", dimension: "number", unit: "", example: "0.38" },
  expansionBelow: {
    label: "Expansion below the softening point",
    dimension: "expansion",
    unit: "ppm/K",
    example: "60 ppm/K",
  },
  expansionAbove: {
    label: "Expansion above the softening point",
    dimension: "expansion",
    unit: "ppm/K",
    example: "190 ppm/K",
  },
  thicknessVariationShare: {
    label: "Thickness variation, of its thickness",
    dimension: "fraction",
    unit: "%",
    example: "5 %",
  },
} as const satisfies Record<string, PropertyDescription>;

/** What only the handling rules ask of it in vacuum and heat. */
export const BOND_HEAT_PROPERTIES = {
  vacuumTemperatureLimit: {
    label: "Temperature limit in vacuum",
    ask: "Highest temperature in vacuum, before it gives off gas",
    dimension: "temperature",
    unit: "°C",
    example: "180 °C",
    hint: "Blank: its temperature limit alone",
  },
  weightLoss: {
    label: "Weight loss in vacuum",
    ask: "Weight loss in vacuum at that temperature",
    dimension: "fraction",
    unit: "%",
    example: "0.3 %",
  },
  limitTime: {
    label: "Longest time at its limit",
    ask: "Longest time at its temperature limit",
    dimension: "time",
    unit: "min",
    example: "60 min",
  },
  thermalTime: {
    label: "Total time hot",
    ask: "Total time hot between bond and debond",
    dimension: "time",
    unit: "h",
    example: "6 h",
  },
} as const satisfies Record<string, PropertyDescription>;

/** What only the handling rules ask of it at a peel. */
export const PEEL_PROPERTIES = {
  peelForce: {
    label: "Peel force per width",
    ask: "Force per width at the peel front",
    dimension: "forcePerLength",
    unit: "N/m",
    example: "40 N/m",
    hint: "Blank: a peel over bumps is a caution",
  },
  peelRadius: {
    label: "Bend radius at the peel front",
    dimension: "length",
    unit: "mm",
    example: "60 mm",
    hint: "Blank: a peel is a caution",
  },
} as const satisfies Record<string, PropertyDescription>;
