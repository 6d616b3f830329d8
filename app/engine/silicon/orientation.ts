import { EngineInputError } from "../errors.ts";

/** Crystal plane of the wafer's face. */
export type Orientation = "100" | "111";

/** Returns the orientation when it is one that the engine knows, else throws `EngineInputError`. */
export function requireOrientation(field: string, value: string): Orientation {
  if (value === "100" || value === "111") return value;
  throw new EngineInputError(field, `'${value}' is not an orientation known here`, "100 or 111");
}
