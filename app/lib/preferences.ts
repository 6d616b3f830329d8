import { DELIVERED_UNITS, type OwnUnits } from "./own-units.ts";

export const THEMES = ["system", "light", "dark"] as const;
export const DENSITIES = ["roomy", "tight"] as const;
export const DECIMAL_MARKS = ["point", "comma"] as const;

/** How a person wants the program to look, to answer their keys and to write figures for them. */
export interface Preferences extends OwnUnits {
  /** 'system' follows the reader's own setting */
  theme: (typeof THEMES)[number];
  /** of tables and lists */
  density: (typeof DENSITIES)[number];
  /** whether a single key acts by itself, outside of fields */
  singleKeys: boolean;
  /** of CSV for a spreadsheet; with a comma, semicolons part the columns */
  decimalMark: (typeof DECIMAL_MARKS)[number];
}

/** As delivered. */
export const DEFAULT_PREFERENCES: Preferences = {
  theme: "system",
  density: "roomy",
  singleKeys: true,
  ...DELIVERED_UNITS,
  decimalMark: "point",
};
