import type { WaferSpot } from "#app/schemas/incident.ts";

/** Where a place on a wafer lies, device side towards the reader and notch down: 'edge, right, 95 % of the radius at 90° from the notch'. */
export function spotWords({ radius, azimuth }: WaferSpot): string {
  const percent = Math.round(radius * 100);
  if (percent < 5) return "in the middle";
  const degrees = Math.round((azimuth * 180) / Math.PI) % 360;
  const ring = percent >= 90 ? "edge" : percent >= 50 ? "outer half" : "inner half";
  return `${ring}, ${sideOf(degrees)}, ${percent}\u00A0% of the radius at ${degrees}° from the notch`;
}

const SIDES = [
  "at the notch",
  "lower right",
  "right",
  "upper right",
  "opposite the notch",
  "upper left",
  "left",
  "lower left",
];

const sideOf = (degrees: number) => SIDES[Math.round(degrees / 45) % SIDES.length] ?? "";
