import { formatQuantity } from "../../units/format.ts";
import { ascendingColumns } from "../columns.ts";
import { fitScan } from "../fit-scan.ts";
import { cannotTell, notSeen, seen, type Found, type Mistake } from "./mistake.ts";
import { ALIKE, APART, distance, type CheckedScan, type Estimate, type ScanChecks } from "./scan-checks.ts";

/** A curvature or tilt below this share of its own standard uncertainty was taken out by arithmetic, not by nature. */
const TAKEN_OUT = 0.01;
/** Tilt over the sagitta from which a scan looks like a line. */
const LIKE_A_LINE = 50;

const mm = (metres: number) => formatQuantity(metres, "length", { unit: "mm", significant: 3, trim: true });

/** Scan of the pair that the checks look at: the one after the film, else the one before. */
const lastScan = ({ post, pre }: ScanChecks): CheckedScan | null => post ?? pre ?? null;

/** Straight line and parabola through a whole scan. */
function wholeFit(scan: CheckedScan) {
  const fit = fitScan(scan, { edgeExclusion: 0 });
  const half = fit.halfWidth;
  return { fit, half, slope: Math.tan(fit.tilt), sagitta: (fit.curvature * half * half) / 2 };
}

export const notHeights: Mistake = {
  number: 7,
  name: "Slope or detrended column taken for height",
  asks: "Is the height column a slope (a straight line where a bow is expected) or what a fit has left over?",
  remedy: "Choose the column that holds the measured height.",
  falseAlarms: 0.005,
  judge(checks) {
    const { expectedChange, pre, post } = checks;
    const read = "line and parabola through the height column";
    const scan = lastScan(checks);
    if (!scan) return cannotTell(read, "No scan is there.");
    const { fit, slope, sagitta, half } = wholeFit(scan);
    const figure = { label: "Curvature of the column", value: fit.curvature, unit: "1/m" as const };
    const plain = fit.standardUncertainty / fit.scatter.inflation;
    if (Math.abs(fit.curvature) < TAKEN_OUT * plain && expectsBow(expectedChange))
      return seen(
        read,
        "The parabola was taken out of this column to the last digit: it is what a fit has left over.",
        figure,
      );
    if (pre && post && expectedChange && expectsBow(expectedChange)) {
      const [before, after] = [wholeFit(pre), wholeFit(post)];
      // A slope column of a bow is a line whose rise per length is the curvature itself.
      const rise: Estimate = {
        value: after.slope - before.slope,
        standardUncertainty: (Math.hypot(before.fit.rms, after.fit.rms) / half) * 0.1,
      };
      const bend: Estimate = {
        value: after.fit.curvature - before.fit.curvature,
        standardUncertainty: Math.hypot(before.fit.standardUncertainty, after.fit.standardUncertainty),
      };
      if (distance(rise, expectedChange) <= ALIKE && distance(bend, expectedChange) > APART)
        return seen(
          read,
          "The change of the column is a line that rises as the expected curvature: the column is a slope, not a height.",
          { label: "Rise of the line", value: rise.value, unit: "1" },
        );
      return notSeen(read, "The columns bend as heights do.", figure);
    }
    return Math.abs(slope * half) > LIKE_A_LINE * Math.abs(sagitta)
      ? cannotTell(read, "The column is close to a straight line: a slope, or a flat wafer that lay tilted.", figure)
      : notSeen(read, "The column bends as heights do.", figure);
  },
};

function expectsBow(expected: Estimate | null | undefined): boolean {
  return !!expected && Math.abs(expected.value) > APART * expected.standardUncertainty;
}

export const tiltRemoved: Mistake = {
  number: 8,
  name: "Tilt taken out by the tool",
  asks: "Has the tool levelled the scan, so that its tilt is zero to the last digit or both ends are at zero?",
  remedy: "Export the scan without levelling where tilt or wedge matters; for curvature it may stay.",
  falseAlarms: 0.02,
  judge(checks) {
    const read = "ends of the scan and the line through it";
    const scan = lastScan(checks);
    if (!scan) return cannotTell(read, "No scan is there.");
    const { x, z } = ascendingColumns("scan", scan);
    const { fit, half } = wholeFit(scan);
    const ends = [z[0] ?? 0, z[z.length - 1] ?? 0];
    const figure = { label: "Tilt of the scan", value: fit.tilt, unit: "rad" as const };
    const rounding = 1e-9 * Math.max(...ends.map(Math.abs), fit.rms, 1e-12);
    const byEnds = ends.every((height) => Math.abs(height) <= rounding);
    const spread = fit.rms / half / Math.sqrt(x.length / 3);
    const byLine = Math.abs(plainSlope(x, z)) < TAKEN_OUT * spread;
    if (byEnds || byLine)
      return seen(
        read,
        `The tool has levelled the scan ${byEnds ? "by its ends" : "by the line through it"}: curvature stands, tilt and wedge are lost.`,
        figure,
      );
    return notSeen(read, "The scan still has its tilt.", figure);
  },
};

/** Slope of the straight line through all points. */
function plainSlope(x: Float64Array, z: Float64Array): number {
  const count = x.length;
  let [meanX, meanZ] = [0, 0];
  for (let n = 0; n < count; n += 1) {
    meanX += (x[n] ?? 0) / count;
    meanZ += (z[n] ?? 0) / count;
  }
  let [xx, xz] = [0, 0];
  for (let n = 0; n < count; n += 1) {
    xx += ((x[n] ?? 0) - meanX) ** 2;
    xz += ((x[n] ?? 0) - meanX) * ((z[n] ?? 0) - meanZ);
  }
  return xz / xx;
}

/** Scans longer than the wafer by this share do not fit on it. */
const LONGER = 1.02;
/** A scan from the centre to the rim covers this much of the diameter. */
const HALF_SCAN = { low: 0.4, high: 0.51 } as const;

export const radiusForDiameter: Mistake = {
  number: 9,
  name: "Radius for diameter",
  asks: "Is the scan twice as long as the wafer is wide, or the bow four times or a quarter of what was expected?",
  remedy: "Give the wafer's diameter, and positions from the centre.",
  falseAlarms: 0.002,
  judge(checks): Found {
    const { wafer, change, expectedChange } = checks;
    const read = "length of the scan, diameter, size of the change";
    const scan = lastScan(checks);
    if (scan && wafer) {
      const { x } = ascendingColumns("scan", scan);
      const [first, last] = [x[0] ?? 0, x[x.length - 1] ?? 0];
      const share = (last - first) / wafer.diameter;
      const figure = { label: "Length of the scan over the diameter", value: share, unit: "1" as const };
      if (share > LONGER)
        return share <= 2 * LONGER
          ? seen(
              read,
              `The scan is ${mm(last - first)} long, the wafer ${mm(wafer.diameter)} wide: that is its radius.`,
              figure,
            )
          : cannotTell(read, "The scan is longer than two wafers: a unit is wrong.", figure);
      if (share >= HALF_SCAN.low && share <= HALF_SCAN.high && Math.abs(first) < 0.02 * wafer.diameter)
        return seen(read, "The positions run from the centre to half of the diameter: they are radii.", figure);
      if (!change || !expectedChange) return notSeen(read, "The scan lies on the wafer from rim to rim.", figure);
    }
    if (!change || !expectedChange)
      return cannotTell(read, "No scan with a diameter and no expected change are there.");
    const figure = {
      label: "Change over the expected one",
      value: safeRatio(change, expectedChange),
      unit: "1" as const,
    };
    if (distance(change, expectedChange) <= APART) return notSeen(read, "The change has the expected size.", figure);
    for (const factor of [4, 0.25])
      if (isTimes(change, expectedChange, factor))
        return seen(
          read,
          `The change is ${factor > 1 ? "four times" : "a quarter of"} the expected one: as with the radius for the diameter.`,
          figure,
        );
    return notSeen(read, "The change is neither four times nor a quarter of the expected one.", figure);
  },
};

/** Ratio of two estimates, 0 where the second is none. */
const safeRatio = (a: Estimate, b: Estimate) => (b.value === 0 ? 0 : a.value / b.value);

/** A measured figure is `factor` times the expected one, which is known well enough to say so. */
function isTimes(measured: Estimate, expected: Estimate, factor: number): boolean {
  const known = Math.abs(expected.value) > APART * expected.standardUncertainty;
  const off = Math.abs(measured.value / factor - expected.value);
  const together = Math.hypot(measured.standardUncertainty / factor, expected.standardUncertainty);
  return known && Math.abs(measured.value) > APART * measured.standardUncertainty && off <= ALIKE * together;
}

const DECADES: [number, string][] = [
  [10, "10 times: nm for Å"],
  [0.1, "a tenth: Å for nm"],
  [1000, "1,000 times: µm for nm"],
  [0.001, "a thousandth: nm for µm"],
  [10000, "10,000 times: µm for Å"],
  [0.0001, "a ten-thousandth: Å for µm"],
];

export const wrongDecade: Mistake = {
  number: 10,
  name: "Decade between nm, Å and µm",
  asks: "Is the change of curvature, or the film's thickness, 10, 1,000 or 10,000 times the expected one, or that part of it?",
  remedy: "Correct the unit of the column or of the film's thickness.",
  falseAlarms: 0.002,
  judge({ change, expectedChange, film }) {
    const read = "size of the change and of the film's thickness";
    if (film?.expectedThickness) {
      const ratio = film.thickness / film.expectedThickness;
      const figure = { label: "Film thickness over the expected one", value: ratio, unit: "1" as const };
      for (const [factor, words] of DECADES)
        if (Math.abs(Math.log10(ratio / factor)) < 0.15) return seen(read, `The film's thickness is ${words}.`, figure);
    }
    if (!change || !expectedChange)
      return film?.expectedThickness
        ? notSeen(read, "The film's thickness has the expected size.")
        : cannotTell(read, "Neither an expected change nor an expected thickness is there.");
    const figure = {
      label: "Change over the expected one",
      value: safeRatio(change, expectedChange),
      unit: "1" as const,
    };
    if (distance(change, expectedChange) > APART)
      for (const [factor, words] of DECADES)
        if (isTimes(change, expectedChange, factor)) return seen(read, `The change is ${words}.`, figure);
    return notSeen(read, "The change is not a decade off.", figure);
  },
};
