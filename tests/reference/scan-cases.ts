import { fitScan, fitSurface, shapeFigures } from "#app/engine/index.ts";

/** A scan by its parameters, SI; its heights are made here and handed on, so that both sides fit the same numbers. */
export interface ScanCase {
  points: number;
  half: number;
  curvature: number;
  tilt: number;
  cubic: number;
  quartic: number;
  scatter: number;
  /** every so many points are lifted by `spike` */
  spikeEvery: number;
  spike: number;
  /** beyond this position all points are lifted by `step` */
  stepFrom: number;
  step: number;
}

export interface SurfaceCase {
  radius: number;
  edgeExclusion: number;
  order: number;
  azimuths: number[];
  points: number;
  scatter: number;
}

/** Scatter between −1 and 1 from the place alone, the same everywhere. */
const scatterAt = (n: number) => (((n * 7919 + 104729) % 10007) / 10007) * 2 - 1;

export function solveScan(c: ScanCase) {
  const x = Float64Array.from({ length: c.points }, (_, n) => c.half * ((2 * n) / (c.points - 1) - 1));
  const z = x.map((at, n) => {
    const t = at / c.half;
    const spiked = c.spikeEvery > 0 && n % c.spikeEvery === 0 ? c.spike : 0;
    const stepped = at > c.stepFrom ? c.step : 0;
    const shape = (c.curvature * at * at) / 2 + c.tilt * at + c.cubic * t ** 3 + c.quartic * t ** 4;
    return shape + c.scatter * scatterAt(n) + spiked + stepped;
  });
  const [plain, robust] = [false, true].map((on) => fitScan({ x, z }, { edgeExclusion: 0, robust: on }));
  return {
    x: [...x],
    z: [...z],
    plain: {
      curvature: plain?.curvature,
      standardUncertainty: plain && plain.standardUncertainty / plain.scatter.inflation,
      quartic: plain?.shape.quarticHeight,
    },
    robust: { curvature: robust?.curvature, rejected: robust?.rejected.length },
  };
}

export function solveSurface(c: SurfaceCase) {
  const scans = c.azimuths.map((azimuth, k) => {
    const half = c.radius - c.edgeExclusion;
    const x = Float64Array.from({ length: c.points }, (_, n) => half * ((2 * n) / (c.points - 1) - 1));
    const z = x.map((s, n) => {
      const [a, b] = [s * Math.cos(azimuth), s * Math.sin(azimuth)];
      const shape = 0.02 * a * a - 0.005 * b * b + 0.008 * a * b + 0.05 * a ** 3 - 0.3 * a * a * b * b + 0.5 * b ** 4;
      return shape + 1e-5 * k + 1e-4 * (k - 1) * s + c.scatter * scatterAt(n + 1000 * k);
    });
    return { azimuth, x: [...x], z: [...z] };
  });
  const surface = fitSurface({ scans, radius: c.radius, edgeExclusion: c.edgeExclusion, order: c.order });
  const { bow, warp } = shapeFigures({ surface, radius: c.radius, waferThickness: 775e-6, gravity: "subtracted" });
  return { scans, rms: surface.rms, bow: bow.value, bowUncertainty: bow.standardUncertainty, warp: warp.value };
}
