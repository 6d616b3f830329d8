import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured properties of a carrier, in the order of its table and form. */
export const CARRIER_PROPERTIES = {
  thickness: { label: "Thickness", dimension: "length", unit: "µm", example: "700 µm" },
  youngsModulus: { label: "Young’s modulus", dimension: "stress", unit: "GPa", example: "74 GPa" },
  poissonsRatio: { label: "Poisson’s ratio", dimension: "number", unit: "", example: "0.22" },
  expansion: {
    label: "Thermal expansion",
    ask: "Thermal expansion, a mean over the range below",
    dimension: "expansion",
    unit: "ppm/K",
    example: "3.0 ppm/K",
    hint: "Blank for silicon, its own curve, and where a curve stands below",
    missing: "by its curve",
  },
  density: { label: "Density", dimension: "density", unit: "kg/m³", example: "2450 kg/m3" },
  thicknessVariation: {
    label: "Thickness variation, TTV",
    ask: "Total thickness variation, TTV",
    dimension: "length",
    unit: "µm",
    example: "1.5 µm",
  },
  temperatureLimit: {
    label: "Temperature limit",
    ask: "Highest temperature it may see",
    dimension: "temperature",
    unit: "°C",
    example: "400 °C",
  },
} as const satisfies Record<string, PropertyDescription>;
