import { bondedFace, type WaferState } from "../flow/state.ts";

/**
 * Whether the walk's shape of a wafer is to be relied on. The walk puts a carrier on the device side: a pair that is bonded by
 * its back side, or by both faces, has no computed shape.
 */
export function shapeIsKnown({ bond, transfer }: Pick<WaferState, "bond" | "transfer">): boolean {
  return transfer === null && (bond === null || bondedFace(bond) === "front");
}
