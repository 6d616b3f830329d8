import { ringProfile } from "../axisymmetric-sag.ts";
import { harmonic, harmonicValue, type Harmonic } from "../point-series.ts";
import { solveDense } from "./dense.ts";

/** Sag on two rails in units of q a⁴/D, plate of radius 1, zero at the rails. */
export interface RailsSag {
  centre: number;
  /** Rim on the line across the rails, and on the line midway between them. */
  rimAcross: number;
  rimAlong: number;
  rimHigh: number;
  rimLow: number;
  /** Highest place of the whole wafer. */
  high: number;
  peakToValley: number;
  /** Contact points along half a rail, from the middle to its end, with the share of the weight on each (and its mirrors). */
  contact: { along: number; share: number }[];
}

/** Fineness of a solution; the table is made with `FINE`, whose error is told by halving it. */
export interface RailsFineness {
  /** Points along half a rail. */
  points: number;
  /** Highest harmonic, even. */
  harmonics: number;
}

export const FINE: RailsFineness = { points: 40, harmonics: 480 };

/**
 * A plate of radius 1 with a free edge under its own weight on two straight rails at x = ±`at`, ν = `nu`, small deflections.
 *
 * The rail's force is cut into points, each four times by symmetry, whose responses are the exact series of `harmonic`; their
 * shares of the weight follow from equal height along the rail. Rails only push: points that would pull are let go and may
 * lift off, points that would sink into the rail come back. With `held` they pull too, which is the solution of a line on
 * which the plate is pinned; it is there to be compared with others' and goes into no table.
 */
export function railsContact(at: number, nu: number, held = false, fineness = FINE): RailsSag {
  const half = Math.sqrt(1 - at * at);
  const sources = Array.from({ length: fineness.points }, (_, j) => {
    // Ends are on the rim; the points crowd towards them.
    const along = half * Math.sin(((j + 1) / fineness.points) * (Math.PI / 2));
    return new Source(Math.min(1, Math.hypot(at, along)), Math.atan2(along, at), along, nu, fineness.harmonics);
  });
  const heights = sources.map((point) => sources.map((from) => from.height(point.radius, point.angle)));
  let active = sources.map((_, j) => j);
  for (let round = 0; round < 20 * fineness.points; round += 1) {
    const shares = sharesOf(active, heights);
    const worst = held ? null : mostNegative(active, shares.share);
    if (worst !== null) {
      active = active.filter((j) => j !== worst);
      continue;
    }
    const surface = (i: number) =>
      active.reduce((sum, j, n) => sum + (heights[i]?.[j] ?? 0) * (shares.share[n] ?? 0), shares.level);
    const sunk = sources.map((_, i) => i).filter((i) => !active.includes(i) && surface(i) < -1e-10);
    if (sunk.length === 0) {
      const contact = active.map((j, n) => ({ source: sources[j], share: shares.share[n] ?? 0 }));
      return measure(contact, shares.level);
    }
    const deepest = sunk.reduce((a, b) => (surface(b) < surface(a) ? b : a));
    active = [...active, deepest].sort((a, b) => a - b);
  }
  throw new Error("the contact on the rails did not settle");
}

/** Four points (±x, ±y) that together carry the plate's weight. */
class Source {
  readonly radius: number;
  readonly angle: number;
  readonly along: number;
  readonly ring: (r: number) => number;
  readonly harmonics: Harmonic[];

  constructor(radius: number, angle: number, along: number, nu: number, highest: number) {
    this.radius = radius;
    this.angle = angle;
    this.along = along;
    this.ring = ringProfile(radius, nu);
    this.harmonics = Array.from({ length: highest / 2 }, (_, k) => harmonic(2 * (k + 1), radius, nu));
  }

  /** Amplitude of cos mθ at r for each harmonic, the points' own angle included. */
  amplitudes(r: number): Float64Array {
    const product = (this.radius * r) ** 2;
    const ratio = (Math.min(r, this.radius) / Math.max(r, this.radius)) ** 2;
    let [products, ratios] = [1, 1];
    return Float64Array.from(this.harmonics, (h) => {
      products *= product;
      ratios *= ratio;
      return harmonicValue(h, r, products, ratios) * Math.cos(h.m * this.angle);
    });
  }

  height(r: number, angle: number): number {
    return this.amplitudes(r).reduce((sum, w, k) => sum + w * Math.cos(2 * (k + 1) * angle), this.ring(r));
  }
}

/** Shares that make the heights of the active points equal to zero; `level` is the rigid shift that does it. */
function sharesOf(active: readonly number[], heights: readonly (readonly number[])[]) {
  const rows = active.map((i) => [...active.map((j) => heights[i]?.[j] ?? 0), 1]);
  const solution = solveDense([...rows, [...active.map(() => 1), 0]], [...active.map(() => 0), 1]);
  return { share: solution.slice(0, -1), level: solution[active.length] ?? 0 };
}

function mostNegative(active: readonly number[], share: readonly number[]): number | null {
  let [worst, least] = [-1, -1e-9];
  active.forEach((j, n) => {
    const value = share[n] ?? 0;
    if (value < least) [worst, least] = [j, value];
  });
  return worst < 0 ? null : worst;
}

function measure(contact: { source: Source | undefined; share: number }[], level: number): RailsSag {
  const sources = contact.flatMap(({ source, share }) => (source ? [{ source, share }] : []));
  const circle = (r: number) => {
    const mean = sources.reduce((sum, { source, share }) => sum + share * source.ring(r), level);
    const sum = new Float64Array(sources[0]?.source.harmonics.length ?? 0);
    for (const { source, share } of sources)
      source.amplitudes(r).forEach((w, k) => (sum[k] = (sum[k] ?? 0) + share * w));
    return ANGLES.map((cosines) => sum.reduce((total, w, k) => total + w * (cosines[k] ?? 0), mean));
  };
  const rim = circle(1);
  const all = Array.from({ length: RADII }, (_, n) => circle((n + 1) / RADII)).flat();
  const centre = sources.reduce((sum, { source, share }) => sum + share * source.ring(0), level);
  return {
    centre,
    rimAcross: rim[0] ?? NaN,
    rimAlong: rim.at(-1) ?? NaN,
    rimHigh: Math.max(...rim),
    rimLow: Math.min(...rim),
    high: Math.max(centre, ...all),
    peakToValley: Math.max(centre, ...all) - Math.min(centre, ...all),
    contact: sources.map(({ source, share }) => ({ along: source.along, share })),
  };
}

const RADII = 60;

/** Cosines of the even harmonics at the angles of a quarter circle. */
const ANGLES = Array.from({ length: 91 }, (_, n) =>
  Float64Array.from({ length: FINE.harmonics / 2 }, (_, k) => Math.cos((2 * (k + 1) * n * Math.PI) / 180)),
);
