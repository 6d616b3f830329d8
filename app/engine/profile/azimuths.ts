import { invertSymmetric } from "../calibration/symmetric.ts";
import { EngineInputError } from "../errors.ts";
import { requireCurvature, requireFinite, requireWithin } from "../inputs.ts";
import { TWO_SIGMA, studentFactor } from "../uncertainty/student.ts";
import { angleBetween } from "./orient-scan.ts";

/** Curvature of one scan. */
export interface AzimuthReading {
  /** angle of the scan's line from the direction centre to notch, counter-clockwise seen on the device side, rad */
  azimuth: number;
  /** 1/m, bowl positive */
  curvature: number;
  /** 1/m, above 0 */
  standardUncertainty: number;
}

/** Shape of a wafer or of its change, as several scans show it. */
export type CurvatureWord = "bowl" | "dome" | "saddle" | "curled" | "flat";

/** Curvatures of w = x² kx/2 + y² ky/2 + t x y, with x at azimuth 0. */
export interface PlaneCurvature {
  /** 1/m */
  x: number;
  y: number;
  /** 1/m */
  twist: number;
  /** of x, y and twist in this order, 1/m² */
  covariance: number[][];
}

export type AzimuthFit =
  | {
      kind: "all directions";
      curvature: PlaneCurvature;
      /** principal curvature of the larger size, 1/m, and the angle of its line from azimuth 0, rad, above −π/2 up to π/2 */
      major: number;
      majorAngle: number;
      /** the other one, across it */
      minor: number;
      majorUncertainty: number;
      minorUncertainty: number;
      /** standard uncertainty of the angle, rad; π/2 where the two principal curvatures cannot be told apart */
      angleUncertainty: number;
      /** half the sum: what an axisymmetric film changes */
      mean: number;
      meanUncertainty: number;
      word: CurvatureWord;
      /** sum of squares of the weighted residuals, and how many of them are free */
      chiSquare: number;
      degreesOfFreedom: number;
      sentence: string;
    }
  | {
      /** two lines at right angles: their mean is that of all directions, the axis stays open */
      kind: "mean only";
      mean: number;
      meanUncertainty: number;
      sentence: string;
    }
  | { kind: "one line"; curvature: number; standardUncertainty: number; sentence: string };

/** Lines nearer than this count as one: 5 degrees; two are at right angles within it. Common practice, no source. */
const APART = (5 * Math.PI) / 180;
/** A principal curvature below this share of the other is that of a roll, where the wafer can be one. */
const ROLLED = 0.25;
/** Coverage factor for telling a curvature from none. */
const SURE = 2;

export const ONE_LINE = "One azimuth alone cannot show a saddle or a roll: scan two more, 60 degrees apart.";
const TWO_LINES =
  "Two azimuths at right angles give the mean curvature but not the axis: a saddle between them cannot be seen. Scan a third.";

/**
 * Curvatures in all directions from scans along several azimuths: κ(θ) = kx cos²θ + ky sin²θ + t sin 2θ by weighted least squares,
 * principal curvatures with their axis, and a word for the shape. Needs three lines at least 5 degrees apart; with fewer it says
 * what cannot be seen. Uncertainties are those of the readings as stated; where the readings disagree more than those allow, by
 * their scatter, they are widened by its size and by Student's factor.
 *
 * @param curledFrom curvature (1/m) from which the free wafer rolls, if it can: half of it or more about one axis is then called curled
 * @throws EngineInputError for no reading or one out of range
 * Source: own derivation ('plane-curvature'); JCGM 102:2011 for the covariance.
 */
export function fitAzimuths(readings: readonly AzimuthReading[], curledFrom?: number): AzimuthFit {
  readings.forEach((reading, n) => {
    requireFinite(`readings[${n}].azimuth`, reading.azimuth);
    requireCurvature(`readings[${n}].curvature`, reading.curvature);
    requireWithin(`readings[${n}].standardUncertainty`, reading.standardUncertainty, 1e-15, 1e7, "1/m");
  });
  const [first] = readings;
  if (!first) throw new EngineInputError("readings", "are none", "at least one scan");
  const lines = distinctLines(readings);
  if (lines.length === 1) return { kind: "one line", ...weightedMean(readings), sentence: ONE_LINE };
  const fitted = lines.length > 2 ? fitTensor(readings) : null;
  if (fitted) return described(fitted, readings, curledFrom);
  const [a, b] = lines;
  if (lines.length > 2 || a === undefined || b === undefined || Math.abs(angleBetween(a, b) - Math.PI / 2) > APART)
    return { kind: "one line", ...weightedMean(readings), sentence: ONE_LINE };
  const along = weightedMean(readings.filter(({ azimuth }) => angleBetween(azimuth, a) <= APART));
  const across = weightedMean(readings.filter(({ azimuth }) => angleBetween(azimuth, a) > APART));
  return {
    kind: "mean only",
    mean: (along.curvature + across.curvature) / 2,
    meanUncertainty: Math.hypot(along.standardUncertainty, across.standardUncertainty) / 2,
    sentence: TWO_LINES,
  };
}

function distinctLines(readings: readonly AzimuthReading[]): number[] {
  const lines: number[] = [];
  for (const { azimuth } of readings)
    if (lines.every((line) => angleBetween(line, azimuth) > APART)) lines.push(azimuth);
  return lines;
}

function weightedMean(readings: readonly AzimuthReading[]): { curvature: number; standardUncertainty: number } {
  let [sum, weights] = [0, 0];
  for (const { curvature, standardUncertainty } of readings) {
    const weight = 1 / standardUncertainty ** 2;
    sum += weight * curvature;
    weights += weight;
  }
  return { curvature: sum / weights, standardUncertainty: 1 / Math.sqrt(weights) };
}

const directions = (azimuth: number) =>
  [Math.cos(azimuth) ** 2, Math.sin(azimuth) ** 2, Math.sin(2 * azimuth)] as const;

interface Tensor extends PlaneCurvature {
  chiSquare: number;
  degreesOfFreedom: number;
}

function fitTensor(readings: readonly AzimuthReading[]): Tensor | null {
  const normal = [0, 1, 2].map(() => [0, 0, 0]);
  const right = [0, 0, 0];
  // Weights against the best reading, so that nothing overflows.
  const best = Math.min(...readings.map(({ standardUncertainty }) => standardUncertainty));
  for (const { azimuth, curvature, standardUncertainty } of readings) {
    const weight = (best / standardUncertainty) ** 2;
    const row = directions(azimuth);
    row.forEach((value, i) => {
      right[i] = (right[i] ?? 0) + weight * value * curvature;
      row.forEach((other, j) => {
        const line = normal[i];
        if (line) line[j] = (line[j] ?? 0) + weight * value * other;
      });
    });
  }
  const inverse = invertSymmetric(normal);
  if (!inverse) return null;
  const [x = 0, y = 0, twist = 0] = inverse.map((row) =>
    row.reduce((sum, value, n) => sum + value * (right[n] ?? 0), 0),
  );
  const chiSquare = readings.reduce((sum, { azimuth, curvature, standardUncertainty }) => {
    const [c, s, cs] = directions(azimuth);
    return sum + ((curvature - c * x - s * y - cs * twist) / standardUncertainty) ** 2;
  }, 0);
  const degreesOfFreedom = readings.length - 3;
  const widened = degreesOfFreedom > 0 ? Math.max(1, chiSquare / degreesOfFreedom) : 1;
  const factor = widened > 1 ? studentFactor(degreesOfFreedom, TWO_SIGMA) / 2 : 1;
  const scale = best * best * widened * factor * factor;
  return { x, y, twist, covariance: inverse.map((row) => row.map((v) => v * scale)), chiSquare, degreesOfFreedom };
}

function described(fit: Tensor, readings: readonly AzimuthReading[], curledFrom?: number): AzimuthFit {
  const { chiSquare, degreesOfFreedom, ...curvature } = fit;
  const mean = (fit.x + fit.y) / 2;
  const half = (fit.x - fit.y) / 2;
  const apart = Math.hypot(half, fit.twist);
  const largest = mean < 0 ? mean - apart : mean + apart;
  const angle = Math.atan2(fit.twist, half) / 2;
  // The angle is that of the larger curvature with its sign; for a dome the larger in size lies across it.
  const turned = mean < 0 ? angle + Math.PI / 2 : angle;
  const majorAngle = turned > Math.PI / 2 ? turned - Math.PI : turned;
  const minor = mean < 0 ? mean + apart : mean - apart;
  const along = uncertaintyAt(fit, majorAngle);
  const across = uncertaintyAt(fit, majorAngle + Math.PI / 2);
  const meanUncertainty = uncertaintyOf(fit, [0.5, 0.5, 0]);
  const apartUncertainty = apart > 0 ? uncertaintyOf(fit, [half / 2 / apart, -half / 2 / apart, fit.twist / apart]) : 0;
  const acrossTurn =
    apart > 0
      ? uncertaintyOf(fit, [
          -fit.twist / (4 * apart * apart),
          fit.twist / (4 * apart * apart),
          half / (2 * apart * apart),
        ])
      : Math.PI / 2;
  const told = apart > SURE * apartUncertainty;
  const word = wordOf(largest, along, minor, across, curledFrom);
  return {
    kind: "all directions",
    curvature,
    major: largest,
    majorAngle,
    minor,
    majorUncertainty: along,
    minorUncertainty: across,
    angleUncertainty: told ? Math.min(acrossTurn, Math.PI / 2) : Math.PI / 2,
    mean,
    meanUncertainty,
    word,
    chiSquare,
    degreesOfFreedom,
    sentence: SENTENCES[word](readings.length),
  };
}

const SENTENCES: Record<CurvatureWord, (count: number) => string> = {
  bowl: (n) => `${n} scans agree on a bowl: it curves up in every direction.`,
  dome: (n) => `${n} scans agree on a dome: it curves down in every direction.`,
  saddle: (n) =>
    `${n} scans show a saddle: it curves up along one axis and down across it, so one azimuth or a mean misleads.`,
  curled: (n) => `${n} scans show a roll about one axis: across it there is little curvature left.`,
  flat: (n) => `${n} scans cannot tell the wafer from flat.`,
};

function wordOf(major: number, along: number, minor: number, across: number, curledFrom?: number): CurvatureWord {
  if (Math.abs(major) <= SURE * along) return "flat";
  if (curledFrom !== undefined && Math.abs(major) >= curledFrom && Math.abs(minor) < ROLLED * Math.abs(major))
    return "curled";
  if (minor * major < 0 && Math.abs(minor) > SURE * across) return "saddle";
  return major > 0 ? "bowl" : "dome";
}

function uncertaintyAt(fit: Tensor, angle: number): number {
  return uncertaintyOf(fit, directions(angle));
}

function uncertaintyOf({ covariance }: Tensor, slopes: readonly [number, number, number]): number {
  let square = 0;
  slopes.forEach((a, i) => slopes.forEach((b, j) => (square += a * b * (covariance[i]?.[j] ?? 0))));
  return Math.sqrt(Math.max(0, square));
}

/** Curvature along an azimuth, 1/m, of a fit in all directions. */
export function curvatureAlong({ x, y, twist }: Pick<PlaneCurvature, "x" | "y" | "twist">, azimuth: number): number {
  const [c, s, cs] = directions(azimuth);
  return c * x + s * y + cs * twist;
}
