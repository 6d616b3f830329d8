import { fitScan } from "#app/engine/profile/fit-scan.ts";
import type { CheckedScan, ScanChecks } from "#app/engine/profile/mistakes/scan-checks.ts";
import { fillNormals, wordsForNormals } from "#app/engine/uncertainty/random/normal.ts";
import { seededState, fillUniforms } from "#app/engine/uncertainty/random/generator.ts";

/** Draws for one case: uniform between two numbers, and normal. */
export function draws(seed: number, stream: number) {
  const state = seededState(seed, stream);
  const one = new Float64Array(1);
  return {
    between(low: number, high: number): number {
      fillUniforms(state, one, 1, new Int32Array(2));
      return low + (high - low) * (one[0] ?? 0);
    },
    normal(): number {
      fillNormals(state, one, 1, new Int32Array(wordsForNormals(1)));
      return one[0] ?? 0;
    },
    normals(count: number): Float64Array {
      const out = new Float64Array(count);
      fillNormals(state, out, count, new Int32Array(wordsForNormals(count)));
      return out;
    },
  };
}

export interface Honest extends ScanChecks {
  pre: CheckedScan;
  post: CheckedScan;
}

const DIAMETER = 0.2;
const DAY = 86400;

/**
 * A pair of scans as an honest technician takes them, with its records: a wafer with a shape of its own of the third, fourth and fifth
 * order, a film that bends it and a little unevenly, tilt of each scan, scatter with or without memory. Drawn from a seed.
 */
export function honestCase(seed: number, stream: number): Honest {
  const draw = draws(seed, stream);
  const points = Math.round(draw.between(200, 600));
  const half = draw.between(0.09, 0.097);
  const own = {
    k: draw.between(-0.004, 0.004),
    cubic: draw.between(-4e-6, 4e-6),
    quartic: draw.between(-4e-6, 4e-6),
    fifth: draw.between(-1e-6, 1e-6),
  };
  const film = (draw.between(0, 1) < 0.5 ? -1 : 1) * draw.between(0.002, 0.02);
  const uneven = draw.between(-0.01, 0.01) * film;
  const memory = draw.between(0, 1) < 0.5 ? 0 : draw.between(0.001, 0.01);
  const scatter = draw.between(10e-9, 80e-9);
  const shape = (x: number) => {
    const t = x / 0.1;
    return (own.k * x * x) / 2 + own.cubic * t ** 3 + own.quartic * t ** 4 + own.fifth * t ** 5;
  };
  const scan = (height: (x: number) => number, at: number): CheckedScan => {
    const noise = draw.normals(points);
    const keep = memory > 0 ? Math.exp(-1 / (memory * points)) : 0;
    const [tilt, level] = [draw.between(-4e-4, 4e-4), draw.between(-5e-6, 5e-6)];
    const x = Float64Array.from({ length: points }, (_, n) => -half + (2 * half * n) / (points - 1));
    let last = noise[0] ?? 0;
    const z = x.map((position, n) => {
      if (n > 0) last = keep * last + Math.sqrt(1 - keep * keep) * (noise[n] ?? 0);
      return height(position) + level + tilt * position + scatter * last;
    });
    return { x, z, azimuth: draw.between(0, Math.PI), at };
  };
  const pre = scan(shape, 0);
  const post = {
    ...scan((x) => shape(x) + (film * x * x) / 2 + uneven * (x / 0.1) ** 4 * 0.005, draw.between(2, 30) * DAY),
    azimuth: pre.azimuth,
  };
  const measured = draw.between(710e-6, 740e-6);
  const u = 0.05 * Math.abs(film);
  return {
    ...estimates({ pre, post }),
    expectedChange: { value: film + u * draw.normal(), standardUncertainty: u },
    wafer: {
      diameter: DIAMETER,
      thickness: measured,
      thicknessFrom: "measured",
      measured: { value: measured, standardUncertainty: 0.5e-6 },
    },
    biaxialModulus: 180.2e9,
    expectedModulus: 180.2e9,
    film: {
      thickness: 1e-6,
      expectedThickness: draw.between(0.9e-6, 1.1e-6),
      usedAt: draw.between(0.9e-6, 1.2e-6),
      curedAt: 0.5 * DAY,
      cures: true,
    },
    azimuths: [0, 60, 120].map((angle) => ({
      azimuth: (angle * Math.PI) / 180,
      curvature: film * (1 + 0.02 * draw.normal()),
      standardUncertainty: 0.02 * Math.abs(film),
    })),
    date: {
      read: { year: 2024, month: 3, day: 1 + Math.floor(draw.between(0, 28)) },
      earliest: { year: 2024, month: 3, day: 1 },
      latest: { year: 2024, month: 3, day: 31 },
    },
    slots: Array.from({ length: 25 }, () => {
      const expected = draw.normal();
      return { expected, measured: expected + 0.5 * draw.normal() };
    }),
  };
}

/** The measured curvatures of a pair, as the checks take them. */
export function estimates<T extends { pre: CheckedScan; post: CheckedScan }>(pair: T) {
  const [before, after] = [pair.pre, pair.post].map((scan) => fitScan(scan, { edgeExclusion: 0.003 }));
  const of = (fit: typeof before) => ({
    value: fit?.curvature ?? 0,
    standardUncertainty: (fit?.expandedUncertainty ?? 0) / 2,
  });
  const [first, second] = [of(before), of(after)];
  return {
    ...pair,
    before: first,
    change: {
      value: second.value - first.value,
      standardUncertainty: Math.hypot(first.standardUncertainty, second.standardUncertainty),
    },
  };
}
