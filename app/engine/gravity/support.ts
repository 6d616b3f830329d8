import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";

/**
 * What carries a wafer, centred under it. All lengths in m, measured in the plane.
 *
 * - `edge-ring`: a ring under the rim; `ring`: a ring of another radius.
 * - `points`: `count` points, equally spaced on a circle.
 * - `centre-point`: one point under the centre.
 * - `centre-cup`: a disc of `radius` that holds the wafer flat on it, such as a vacuum cup.
 * - `rails`: two straight parallel rails, `halfSpacing` either side of the centre. They push and never pull, so that the wafer
 *   may lift off parts of them.
 */
export type Support =
  | { kind: "edge-ring" }
  | { kind: "ring"; radius: number }
  | { kind: "points"; count: number; radius: number }
  | { kind: "centre-point" }
  | { kind: "centre-cup"; radius: number }
  | { kind: "rails"; halfSpacing: number };

/** What boats, stores and grippers carry a wafer by. */
export type CarryingSupport = Extract<Support, { kind: "points" | "rails" }>;

/** A support with its length as a share of the wafer's radius. */
export type RelativeSupport =
  { kind: "ring"; at: number } | { kind: "centre-point" } | { kind: "centre-cup"; at: number } | RelativeCarrying;

export type RelativeCarrying = { kind: "points"; count: number; at: number } | { kind: "rails"; at: number };

/** Range of rails over the wafer's radius: nearer the centre the wafer tips, nearer the rim it slips off. */
export const RAILS_RANGE = { low: 0.05, high: 0.99 } as const;

const MOST_POINTS = 100;

/** Checks a support under a wafer of `radius` (m) and makes its length relative. Throws `EngineInputError`. */
export function checkSupport(support: Support, radius: number): RelativeSupport {
  switch (support.kind) {
    case "edge-ring":
      return { kind: "ring", at: 1 };
    case "ring":
      return { kind: "ring", at: share("radius", support.radius, radius, 0.01, 1) };
    case "centre-point":
      return support;
    case "centre-cup":
      return { kind: "centre-cup", at: share("radius", support.radius, radius, 0.01, 0.99) };
    case "points":
    case "rails":
      return checkCarrying(support, radius);
    default:
      throw new EngineInputError(
        "support.kind",
        "is not a support known here",
        "edge-ring, ring, points, centre-point, centre-cup or rails",
      );
  }
}

/** The same for points and rails. */
export function checkCarrying(support: CarryingSupport, radius: number): RelativeCarrying {
  if (support.kind === "rails")
    return {
      kind: "rails",
      at: share("halfSpacing", support.halfSpacing, radius, RAILS_RANGE.low, RAILS_RANGE.high),
    };
  const count = requireWithin("support.count", support.count, 3, MOST_POINTS, "1");
  if (!Number.isInteger(count)) throw new EngineInputError("support.count", "must be a whole number");
  return { kind: "points", count, at: share("radius", support.radius, radius, 0.05, 1) };
}

function share(field: string, length: number, radius: number, low: number, high: number): number {
  return requireWithin(`support.${field}`, length, low * radius, high * radius, "m") / radius;
}
