import { EngineInputError } from "../../errors.ts";
import { requireRadius, requireThickness, requireWithin } from "../../inputs.ts";
import type { SourceId } from "../../sources.ts";
import { combinedSurface, surfaceEvaluator, type Surface } from "./surface.ts";
import { zernikeBasis } from "./zernike.ts";

/** How the wafer's weight was dealt with when it was measured. */
export type GravityHandling = "cancelled by turning over" | "subtracted" | "included" | "not stated";

export interface ShapeFiguresInput {
  /** surface of the device side, z up; or of the median when it was measured so */
  surface: Surface;
  /** which surface that is; default the front one */
  of?: "front surface" | "median surface";
  /** thickness over the wafer, on the same disk; without it the front surface stands for the median one */
  thickness?: Surface | null;
  /** of the wafer, m */
  radius: number;
  /** of the wafer, m */
  waferThickness: number;
  gravity: GravityHandling;
  /** angle of the first of the three points from the notch, rad; default π (opposite the notch) */
  firstPoint?: number;
}

export interface ShapeFigure {
  name: "bow" | "bow, best fit" | "warp" | "sori";
  /** m; bow is the standard one: centre above the plane, device side up, is positive */
  value: number;
  /** of the scatter about the surface, m */
  standardUncertainty: number;
  /** what it is, with surface, reference plane and the radius that it covers */
  definition: string;
  source: SourceId;
}

export interface ShapeFigures {
  bow: ShapeFigure;
  bowBestFit: ShapeFigure;
  warp: ShapeFigure;
  sori: ShapeFigure;
  /** what stands against quoting them as by the standard */
  remarks: string[];
}

/** The three points lie this far inside the rim, m (MF534, from memory). */
const POINTS_INSIDE = 3e-3;
/** Scope of the standards (from memory of MF534 and MF1390). */
const WARP_FROM = 100e-6;
const BOW_FROM = 180e-6;
const BOW_SLENDER = 250;
const WARP_DIAMETER = 50e-3;
/** Places on which the highest and lowest are sought. */
const RINGS = 80;
const AROUND = 360;

const mm = (metres: number) => `${Number((metres * 1e3).toPrecision(4))} mm`;

/**
 * Bow, warp and sori of a wafer by the definitions of SEMI MF534, MF1390 and MF1451, from fitted surfaces.
 *
 * - bow: distance of the centre of the median surface from the plane through three points of it, 120° apart, 3 mm inside the rim
 *   (on the rim of the fitted disk when that ends sooner); centre above, device side up, is positive.
 * - bow, best fit: the same from the least-squares plane of the median surface over the disk; tools print it beside the other.
 * - warp: highest less lowest deviation of the median surface from its least-squares plane, never negative.
 * - sori: the same of the front surface from its own plane.
 *
 * The least-squares plane over the full disk is the surface's own height and tilt terms, as the other circle polynomials are
 * orthogonal to it. Highest and lowest are sought on 80 rings of 360 places: within 2e-4 of the figure (measured). The standards
 * themselves were not read; the definitions are those that Marks, Hassan and Cheong 2014 quote, ASTM F534 and F1390 from memory.
 * @throws EngineInputError for surfaces on different disks or a wafer out of range
 */
export function shapeFigures(i: ShapeFiguresInput): ShapeFigures {
  const radius = requireRadius("radius", i.radius);
  const thickness = requireThickness("waferThickness", i.waferThickness);
  const first = requireWithin("firstPoint", i.firstPoint ?? Math.PI, -10, 10, "rad");
  const { surface } = i;
  if (i.thickness && Math.abs(i.thickness.radius - surface.radius) > 1e-6 * surface.radius)
    throw new EngineInputError("thickness", "covers another disk than the surface", mm(surface.radius));
  const isMedian = i.of === "median surface";
  const median = i.thickness && !isMedian ? combinedSurface(surface, i.thickness, -0.5) : surface;
  const front = i.thickness && isMedian ? combinedSurface(surface, i.thickness, 0.5) : surface;
  const at = Math.min(radius - POINTS_INSIDE, surface.radius);
  const within = `within ${mm(surface.radius)} of the centre, edge exclusion ${mm(radius - surface.radius)}`;
  const points = [0, 1, 2].map((n) => first + (2 * Math.PI * n) / 3);
  const warp = peakToValley(levelled(median));
  return {
    bow: {
      name: "bow",
      ...linearFigure(median, (value) => [
        ...points.map((angle) => ({ weight: -1 / 3, ...value(at * Math.cos(angle), at * Math.sin(angle)) })),
        { weight: 1, ...value(0, 0) },
      ]),
      definition: `Centre of the median surface over the plane through three points of it, 120° apart, ${mm(at)} from the centre.`,
      source: "semi-mf534",
    },
    bowBestFit: {
      name: "bow, best fit",
      ...linearFigure(levelled(median), (value) => [{ weight: 1, ...value(0, 0) }]),
      definition: `Centre of the median surface over its least-squares plane ${within}.`,
      source: "semi-mf1390",
    },
    warp: {
      name: "warp",
      ...warp,
      definition: `Highest less lowest deviation of the median surface from its least-squares plane ${within}.`,
      source: "semi-mf1390",
    },
    sori: {
      name: "sori",
      ...(front === median ? warp : peakToValley(levelled(front))),
      definition: `Highest less lowest deviation of the front surface from its least-squares plane ${within}.`,
      source: "semi-mf1451",
    },
    remarks: [...scopeRemarks(radius, thickness), ...handlingRemarks(i), ...surface.remarks],
  };
}

/** The surface less its least-squares plane; one that has none, as from scans through the centre, is itself. */
function levelled(surface: Surface): Surface {
  if (surface.terms.every(({ n, value, standardUncertainty }) => n >= 2 || (value === 0 && standardUncertainty === 0)))
    return surface;
  const flat = surface.terms.map(({ n }) => n < 2);
  return {
    ...surface,
    terms: surface.terms.map((term, k) => (flat[k] ? { ...term, value: 0, standardUncertainty: 0 } : term)),
    covariance: surface.covariance.map((row, a) => row.map((value, b) => (flat[a] || flat[b] ? 0 : value))),
  };
}

type Place = { x: number; y: number };

/** A weighted sum of heights of a surface with its standard uncertainty. */
function linearFigure(
  surface: Surface,
  parts: (place: (x: number, y: number) => Place) => ({ weight: number } & Place)[],
): { value: number; standardUncertainty: number } {
  const basis = zernikeBasis(surface.order);
  const slopes = new Float64Array(surface.terms.length);
  const row = new Float64Array(surface.terms.length);
  for (const { weight, x, y } of parts((atX, atY) => ({ x: atX, y: atY }))) {
    basis.fill(x / surface.radius, y / surface.radius, row);
    for (let k = 0; k < row.length; k += 1) slopes[k] = (slopes[k] ?? 0) + weight * (row[k] ?? 0);
  }
  const value = surface.terms.reduce((sum, term, k) => sum + term.value * (slopes[k] ?? 0), 0);
  let square = 0;
  surface.covariance.forEach((line, a) =>
    line.forEach((covariance, b) => (square += covariance * (slopes[a] ?? 0) * (slopes[b] ?? 0))),
  );
  return { value: value === 0 ? 0 : value, standardUncertainty: Math.sqrt(Math.max(0, square)) };
}

/** Highest less lowest height over the disk. */
function peakToValley(surface: Surface): { value: number; standardUncertainty: number } {
  const { low, high } = extremes(surface);
  return linearFigure(surface, (place) => [
    { weight: 1, ...place(high.x, high.y) },
    { weight: -1, ...place(low.x, low.y) },
  ]);
}

interface Extremes {
  low: Place & { z: number };
  high: Place & { z: number };
}

/** Found once for each surface: figures and contours both ask. */
const found = new WeakMap<Surface, Extremes>();

/** Highest and lowest place of a surface on its disk. */
export function extremes(surface: Surface): Extremes {
  const known = found.get(surface) ?? search(surface);
  found.set(surface, known);
  return known;
}

function search(surface: Surface): Extremes {
  const height = surfaceEvaluator(surface);
  let low = { x: 0, y: 0, z: height(0, 0) };
  let high = low;
  for (let ring = 1; ring <= RINGS; ring += 1) {
    const r = (surface.radius * ring) / RINGS;
    for (let n = 0; n < AROUND; n += 1) {
      const angle = (2 * Math.PI * n) / AROUND;
      const [x, y] = [r * Math.cos(angle), r * Math.sin(angle)];
      const z = height(x, y);
      if (z < low.z) low = { x, y, z };
      if (z > high.z) high = { x, y, z };
    }
  }
  return { low, high };
}

function scopeRemarks(radius: number, thickness: number): string[] {
  const remarks: string[] = [];
  if (thickness < WARP_FROM)
    remarks.push(
      "Below about 100\u00A0µm these methods are outside their scope (SEMI MF1390, MF1451): say how the wafer was held when you quote the figures.",
    );
  else if (thickness < BOW_FROM || (2 * radius) / thickness > BOW_SLENDER)
    remarks.push(
      "Bow by SEMI MF534 is for wafers of at least 180\u00A0µm and at most 250 times as wide as thick (from memory): warp and sori stand, bow is outside its scope.",
    );
  if (2 * radius < WARP_DIAMETER)
    remarks.push("Warp by SEMI MF1390 is for wafers of at least 50 mm (from memory): outside its scope.");
  return remarks;
}

function handlingRemarks({ gravity, thickness, of }: ShapeFiguresInput): string[] {
  const remarks: string[] = [];
  if (gravity === "included")
    remarks.push("The wafer's own weight is in these figures; the standards take it out by turning the wafer over.");
  if (gravity === "not stated")
    remarks.push("How the wafer's own weight was dealt with is not stated; the standards take it out.");
  if (!thickness)
    remarks.push(
      of === "median surface"
        ? "No thickness map: the median surface stands for the front one, so sori equals warp."
        : "No thickness map: the front surface stands for the median one, so warp equals sori; half the thickness variation may be missing.",
    );
  return remarks;
}
