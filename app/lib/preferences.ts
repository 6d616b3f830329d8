export const THEMES = ["system", "light", "dark"] as const;
export const DENSITIES = ["roomy", "tight"] as const;

/** How a person wants the program to look and to answer their keys. */
export interface Preferences {
  /** 'system' follows the reader's own setting */
  theme: (typeof THEMES)[number];
  /** of tables and lists */
  density: (typeof DENSITIES)[number];
  /** whether a single key acts by itself, outside of fields */
  singleKeys: boolean;
}

/** As delivered. */
export const DEFAULT_PREFERENCES: Preferences = { theme: "system", density: "roomy", singleKeys: true };
