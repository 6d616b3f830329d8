import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured property of a silicon wafer; everything else follows from its crystal. */
export const SILICON_PROPERTIES = {
  thickness: {
    label: "Thickness",
    ask: "Thickness as it is bought",
    dimension: "length",
    unit: "µm",
    example: "775 µm",
  },
} as const satisfies Record<string, PropertyDescription>;

/** How a face is written: the plane in brackets. */
export const FACES = { "100": "(001)", "111": "(111)" } as const;
