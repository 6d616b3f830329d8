import type { LimitDefinition } from "#app/engine/rules/limits.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity } from "#app/engine/units/format.ts";

/** How a limit is typed and shown. */
export interface LimitQuantity {
  dimension: Dimension;
  unit: string;
}

/** The quantity that a limit's SI unit stands for. */
export function limitQuantity({ unit, temperaturePoint, count }: LimitDefinition): LimitQuantity {
  switch (unit) {
    case "m":
      return { dimension: "length", unit: "µm" };
    case "K":
      return temperaturePoint
        ? { dimension: "temperature", unit: "°C" }
        : { dimension: "temperatureDifference", unit: "K" };
    case "1":
      return { dimension: "fraction", unit: count ? "" : "%" };
    case "Pa":
      return { dimension: "stress", unit: "MPa" };
    case "s":
      return { dimension: "time", unit: "h" };
  }
}

/** A limit's value with its unit. */
export function limitText(value: number, { dimension, unit }: LimitQuantity): string {
  return formatQuantity(value, dimension, { unit, significant: 12, trim: true });
}
