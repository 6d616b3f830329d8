/**
 * A limit that rules judge against: it has a meaning, a default, a unit and a source, and is a site's to set.
 * A default marked 'common practice, no source' is a habit of the trade, not a published figure.
 */
export interface LimitDefinition {
  title: string;
  /** default in SI units */
  value: number;
  unit: "m" | "K" | "1" | "Pa" | "s";
  temperatureDifference?: boolean;
  temperaturePoint?: boolean;
  /** a whole number, not a share */
  count?: boolean;
  rule: number;
  source: string;
}

export const PRACTICE = "common practice, no source";
