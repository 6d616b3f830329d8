import { formatQuantity } from "../../units/format.ts";
import { angleBetween, lineAzimuth } from "../orient-scan.ts";
import { fingerprint } from "./fingerprint.ts";
import { USUAL_EXCLUSION } from "./inside.ts";
import { cannotTell, notSeen, seen, type Mistake } from "./mistake.ts";
import { ALIKE, APART, distance, scaledEstimate, type Estimate, type ScanChecks } from "./scan-checks.ts";

/** Correlation from which a part of the shape counts as the same, or as turned over. */
const SAME = 0.8;
/** Correlation below which two parts have nothing to do with each other. */
const STRANGE = 0.4;
/** Angles within this count as equal: 10 degrees. Common practice, no source. */
const NEAR = (10 * Math.PI) / 180;

const perKilometre = (value: number) => formatQuantity(value, "curvature", { unit: "1/km", significant: 3 });

function shapeOf({ pre, post, edgeExclusion = USUAL_EXCLUSION }: ScanChecks) {
  return pre && post ? fingerprint(pre, post, edgeExclusion) : { even: null, odd: null };
}

/** What the change would read if the scan after had been taken face down: −(κ0 + Δ) − κ0. */
function faceDownChange(expected: Estimate, before: Estimate): Estimate {
  return {
    value: -expected.value - 2 * before.value,
    standardUncertainty: Math.hypot(expected.standardUncertainty, 2 * before.standardUncertainty),
  };
}

export const swapped: Mistake = {
  number: 1,
  name: "Pre and post swapped",
  asks: "Is the scan called 'before' later than the one called 'after', or is the change the expected one with its sign reversed?",
  remedy: "Exchange the two files.",
  falseAlarms: 0.002,
  judge(checks) {
    const { pre, post, change, expectedChange, before } = checks;
    const [first, second] = [pre?.at, post?.at];
    if (typeof first === "number" && typeof second === "number" && first !== second) {
      const hours = { label: "Post less pre", value: second - first, unit: "s" as const };
      return second < first
        ? seen("times of the scans", "The scan before the film was taken after the one after it.", hours)
        : notSeen("times of the scans", "The scans were taken in the order that they are called.", hours);
    }
    const read = "sign and size of the change of curvature";
    if (!change || !expectedChange) return cannotTell(read, "Neither times nor an expected change are there.");
    const figure = { label: "Change of curvature", value: change.value, unit: "1/m" as const };
    if (distance(change, expectedChange) <= APART)
      return notSeen(read, `The change, ${perKilometre(change.value)}, is as expected.`, figure);
    if (distance(change, scaledEstimate(expectedChange, -1)) > ALIKE)
      return notSeen(read, "The change is not the expected one reversed.", figure);
    const { even } = shapeOf(checks);
    if (even !== null && even <= -SAME)
      return notSeen(read, "The sign is reversed because one scan was taken face down.", figure);
    const told =
      (even !== null && even >= SAME) || (before && distance(change, faceDownChange(expectedChange, before)) > APART);
    return told
      ? seen(
          read,
          `The change, ${perKilometre(change.value)}, is the expected one, ${perKilometre(expectedChange.value)}, with its sign reversed.`,
          figure,
        )
      : cannotTell(read, "The sign is reversed: the scans are swapped, or one was taken face down.", figure);
  },
};

export const faceDown: Mistake = {
  number: 2,
  name: "Post scanned face down",
  asks: "Is what a wafer keeps through a film, its shape beyond the parabola, turned over between the scans?",
  remedy: "Say that the scan after was taken with the back side up, or scan again.",
  falseAlarms: 0.002,
  judge(checks) {
    const { change, expectedChange, before } = checks;
    const { even } = shapeOf(checks);
    const read = "shape beyond the parabola in both scans";
    if (even !== null && Math.abs(even) >= SAME) {
      const figure = { label: "Correlation of the even parts", value: even, unit: "1" as const };
      return even < 0
        ? seen(read, "What stands up in the scan before lies low in the one after: it was taken face down.", figure)
        : notSeen(read, "Both scans show the same side.", figure);
    }
    if (!change || !expectedChange || !before)
      return cannotTell(read, "The wafer's own shape is too faint, and no expected change is there.");
    const figure = { label: "Change of curvature", value: change.value, unit: "1/m" as const };
    const sign = "curvature before and change of curvature";
    if (distance(change, expectedChange) <= APART) return notSeen(sign, "The change is as expected.", figure);
    const turned = faceDownChange(expectedChange, before);
    if (distance(change, turned) > ALIKE) return notSeen(sign, "The change is not that of a scan face down.", figure);
    return distance(change, scaledEstimate(expectedChange, -1)) > APART
      ? seen(sign, "The change is what a scan after the film would give face down.", figure)
      : cannotTell(sign, "The sign is reversed: the scans are swapped, or one was taken face down.", figure);
  },
};

export const azimuthOff: Mistake = {
  number: 3,
  name: "Azimuth off by 90 or 180 degrees",
  asks: "Do both scans lie on one line and run the same way, by their records and by the wafer's own shape?",
  remedy: "Correct the azimuth of the scan, or scan again on the line of the first.",
  falseAlarms: 0.005,
  judge(checks) {
    const [first, second] = [checks.pre?.azimuth, checks.post?.azimuth];
    if (typeof first === "number" && typeof second === "number") {
      const angle = angleBetween(first, second);
      const figure = { label: "Angle between the lines", value: angle, unit: "rad" as const };
      if (angle > NEAR)
        return seen(
          "azimuths of the scans",
          `The scans lie ${formatQuantity(angle, "angle", { unit: "°", decimals: 0 })} apart.`,
          figure,
        );
      const turned = Math.abs(Math.abs(first - second) - Math.PI) < NEAR;
      if (turned && Math.abs(lineAzimuth(first) - lineAzimuth(second)) < NEAR)
        return seen("azimuths of the scans", "The second scan runs the other way along the same line.", figure);
    }
    const { even, odd } = shapeOf(checks);
    const read = "shape beyond the parabola in both scans";
    if (odd !== null && even !== null && Math.abs(odd) < STRANGE && Math.abs(even) < STRANGE)
      return seen(
        read,
        "The two scans have nothing in common: they lie on different lines, or are of different wafers.",
        {
          label: "Correlation of the odd parts",
          value: odd,
          unit: "1",
        },
      );
    if (odd === null) return cannotTell(read, "The wafer's own shape is too faint to tell the lines apart.");
    const figure = { label: "Correlation of the odd parts", value: odd, unit: "1" as const };
    // Face down over the line across also turns the odd part, but then the even one too.
    if (odd <= -SAME && (even === null || even >= SAME))
      return even === null
        ? cannotTell(read, "The scans run opposite ways, or one was taken face down.", figure)
        : seen(read, "The second scan runs the other way: its azimuth is 180 degrees off.", figure);
    return odd >= SAME
      ? notSeen(read, "Both scans lie on one line and run the same way.", figure)
      : cannotTell(read, "The wafer's own shape does not tell.", figure);
  },
};
