import type { PropertyDescription } from "#app/components/library/property.ts";

/** The measured properties of a tool, in the order of its table and form. */
export const TOOL_PROPERTIES = {
  warpLimitEdgesUp: {
    label: "Warp limit, edges up",
    ask: "Warp limit, edges up as loaded",
    dimension: "length",
    unit: "µm",
    example: "400 µm",
    hint: "Blank: no limit, on a frame",
    missing: "no limit",
  },
  warpLimitEdgesDown: {
    label: "Warp limit, edges down",
    ask: "Warp limit, edges down as loaded",
    dimension: "length",
    unit: "µm",
    example: "500 µm",
    hint: "Blank: no limit, on a frame",
    missing: "no limit",
  },
  leastUnsupportedThickness: {
    label: "Least unsupported thickness",
    ask: "Least silicon thickness that it takes without support",
    dimension: "length",
    unit: "µm",
    example: "250 µm",
    hint: "0 µm: it takes any; blank: not known",
  },
  largestDiameter: {
    label: "Largest diameter",
    ask: "Largest wafer or carrier that it takes",
    dimension: "length",
    unit: "mm",
    example: "300 mm",
  },
} as const satisfies Record<string, PropertyDescription>;

/** What only the handling rules ask of a tool. */
export const TOOL_HANDLING_PROPERTIES = {
  sealGap: {
    label: "Gap that its seal closes",
    ask: "Gap under the wafer that its vacuum seal still closes",
    dimension: "length",
    unit: "mm",
    example: "1 mm",
    hint: "Blank: the site’s limit for its seal",
  },
  slotClearance: {
    label: "Clearance in a slot",
    ask: "Clear height over and under what lies in a slot",
    dimension: "length",
    unit: "mm",
    example: "3 mm",
    hint: "Blank: in a store the site’s limit",
  },
  weightLimit: {
    label: "Weight limit",
    ask: "Heaviest that its robot takes",
    dimension: "mass",
    unit: "g",
    example: "300 g",
  },
  totalThicknessLimit: {
    label: "Thickness limit",
    ask: "Thickest that its robot and aligner take, wafer and carrier together",
    dimension: "length",
    unit: "mm",
    example: "1.8 mm",
  },
} as const satisfies Record<string, PropertyDescription>;
