import { surfaceContours } from "#app/engine/profile/map/surface-contours.ts";
import { surfaceEvaluator, type Surface } from "#app/engine/profile/map/surface.ts";
import type { MapView } from "#app/schemas/film-analysis.ts";

/** The wafer's radius in the unit of the paths. */
export const DRAWN_RADIUS = 1000;
const STRIPS = 80;
/** Places along a strip at which its height is read. */
const ALONG = 120;

/**
 * A surface as paths to draw: lines of equal height, and strips between them to shade. The notch is down: x, from the centre to the
 * notch, runs down, y to the right.
 */
export function mapView(surface: Surface, waferRadius: number): MapView {
  const { radius, low, high, step, levels } = surfaceContours(surface);
  const unit = DRAWN_RADIUS / waferRadius;
  const at = (metres: number) => Math.round(metres * unit);
  return {
    radius,
    waferRadius,
    low,
    high,
    step,
    levels: levels.map(({ height, lines }) => ({
      height,
      path: lines.map((line) => line.map(({ x, y }, n) => `${n === 0 ? "M" : "L"}${at(y)} ${at(x)}`).join("")).join(""),
    })),
    bands: step > 0 ? bandsOf(surface, step, unit) : [],
  };
}

/** Each strip of the disk is cut where it passes from one band of heights into the next. */
function bandsOf(surface: Surface, step: number, unit: number): MapView["bands"] {
  const { radius } = surface;
  const height = surfaceEvaluator(surface);
  const paths = new Map<number, string>();
  const width = (2 * radius) / STRIPS;
  const thick = Math.ceil(width * unit);
  for (let strip = 0; strip < STRIPS; strip += 1) {
    const x = -radius + (strip + 0.5) * width;
    const half = Math.sqrt(radius * radius - x * x);
    const top = Math.round((x - width / 2) * unit);
    const place = (n: number) => -half + (2 * half * n) / ALONG;
    const band = (n: number) => Math.floor(height(x, place(n + 0.5)) / step);
    let begun = 0;
    for (let n = 1; n <= ALONG; n += 1) {
      if (n < ALONG && band(n) === band(begun)) continue;
      const [left, right] = [Math.round(place(begun) * unit), Math.round(place(n) * unit)];
      const key = band(begun);
      paths.set(key, `${paths.get(key) ?? ""}M${left} ${top}H${right}v${thick}H${left}z`);
      begun = n;
    }
  }
  return [...paths].sort(([a], [b]) => a - b).map(([band, path]) => ({ height: (band + 0.5) * step, path }));
}
