import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured properties of a film, in the order of its table and form. */
export const FILM_PROPERTIES = {
  stress: {
    label: "Stress at 25\u00A0°C, tension positive",
    ask: "Stress at 25\u00A0°C, held flat on a full-thickness monitor; tension is positive",
    dimension: "stress",
    unit: "MPa",
    sign: true,
    example: "-120 MPa",
  },
  youngsModulus: { label: "Young’s modulus", dimension: "stress", unit: "GPa", example: "117 GPa" },
  poissonsRatio: { label: "Poisson’s ratio", dimension: "number", unit: "", example: "0.34" },
  expansion: { label: "Thermal expansion", dimension: "expansion", unit: "ppm/K", example: "16.7 ppm/K" },
  yieldStress: {
    label: "Yield stress at 25\u00A0°C",
    ask: "Yield stress at 25\u00A0°C, for a metal that yields",
    dimension: "stress",
    unit: "MPa",
    example: "200 MPa",
    hint: "Blank: it stays elastic",
    missing: "none: it stays elastic",
  },
  zeroStressTemperature: {
    label: "Zero-stress temperature",
    ask: "Zero-stress temperature of a polymer, from where on it carries none",
    dimension: "temperature",
    unit: "°C",
    example: "230 °C",
    hint: "Blank: its expansion decides",
    missing: "not given: its expansion decides",
  },
  temperatureLimit: {
    label: "Temperature limit",
    ask: "Highest temperature it may see",
    dimension: "temperature",
    unit: "°C",
    example: "350 °C",
  },
} as const satisfies Record<string, PropertyDescription>;

/** What only the handling rules ask of a film. */
export const FILM_HANDLING_PROPERTIES = {
  solderMelting: {
    label: "Its solder melts at",
    ask: "Temperature at which the solder of this film melts",
    dimension: "temperature",
    unit: "°C",
    example: "221 °C",
    hint: "Blank: no solder, or its temperature limit",
  },
} as const satisfies Record<string, PropertyDescription>;
