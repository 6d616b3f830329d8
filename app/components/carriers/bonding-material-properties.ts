import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured properties of a bonding material, in the order of its table and form. */
export const BONDING_MATERIAL_PROPERTIES = {
  softening: {
    label: "Softening point",
    ask: "Softening point or glass transition",
    dimension: "temperature",
    unit: "°C",
    example: "120 °C",
    hint: "Blank: none in the range used",
    missing: "none in the range used",
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
