import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured properties of a tape, in the order of its table and form. */
export const TAPE_PROPERTIES = {
  thickness: {
    label: "Thickness",
    ask: "Thickness, its adhesive included",
    dimension: "length",
    unit: "µm",
    example: "150 µm",
  },
  temperatureLimit: {
    label: "Temperature limit",
    ask: "Highest temperature it may see",
    dimension: "temperature",
    unit: "°C",
    example: "80 °C",
    hint: "Blank: the site’s limit for tape",
    missing: "the site’s limit for tape",
  },
  embeddingDepth: {
    label: "Soft layer that takes up bumps",
    dimension: "length",
    unit: "µm",
    example: "200 µm",
    hint: "0 µm when it has none",
  },
  thicknessVariation: {
    label: "Thickness variation",
    ask: "Thickness variation over a wafer",
    dimension: "length",
    unit: "µm",
    example: "3 µm",
    hint: "Blank: left out of the thickness budget",
  },
  longestTime: {
    label: "Longest time on it",
    ask: "Longest time that a wafer may stay on it",
    dimension: "time",
    unit: "d",
    example: "7 d",
    hint: "Blank: the site’s red line",
    missing: "the site’s red line",
  },
} as const satisfies Record<string, PropertyDescription>;
