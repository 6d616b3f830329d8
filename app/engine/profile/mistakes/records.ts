import { formatQuantity } from "../../units/format.ts";
import { fitAzimuths } from "../azimuths.ts";
import { ascendingColumns, firstFrom, type ScanColumns } from "../columns.ts";
import { fitScan, type ProfileFit } from "../fit-scan.ts";
import { fittedHeight } from "../fitted-height.ts";
import { USUAL_EXCLUSION } from "./inside.ts";
import { cannotTell, notSeen, seen, type Mistake } from "./mistake.ts";
import type { CalendarDay } from "./scan-checks.ts";

const percent = (share: number) => formatQuantity(share, "fraction", { unit: "%", significant: 2, trim: true });
const time = (seconds: number) => formatQuantity(seconds, "time", { significant: 2, trim: true });

export const hiddenSaddle: Mistake = {
  number: 11,
  name: "Averaged azimuths that hide a saddle",
  asks: "Do the azimuths of one wafer bend opposite ways, so that their mean says little?",
  remedy: "Keep the azimuths apart and use the curvatures along both axes.",
  falseAlarms: 0.002,
  judge({ azimuths, pre, post }) {
    const read = "curvatures along the azimuths";
    const averaged = Math.max(pre?.azimuthsAveraged ?? 0, post?.azimuthsAveraged ?? 0) > 1;
    if (!azimuths || azimuths.length === 0)
      return cannotTell(
        read,
        averaged ? "The tool has averaged its azimuths: a saddle cannot be seen in them." : "No azimuths are there.",
      );
    const fit = fitAzimuths(azimuths);
    if (fit.kind !== "all directions") return cannotTell(read, fit.sentence);
    const figure = {
      label: "Curvature across over along",
      value: fit.major === 0 ? 0 : fit.minor / fit.major,
      unit: "1" as const,
    };
    // Three standard uncertainties each, as two signs are judged at once.
    const sure = Math.abs(fit.major) > 3 * fit.majorUncertainty && Math.abs(fit.minor) > 3 * fit.minorUncertainty;
    return fit.word === "saddle" && sure
      ? seen(
          read,
          `The wafer is a saddle: the mean over the azimuths is ${percent(Math.abs(fit.mean / fit.major))} of what it bends along its axis.`,
          figure,
        )
      : notSeen(read, fit.sentence, figure);
  },
};

/** Time after cure before which a polymer still moves, s. Common practice, no source. */
export const SETTLED_AFTER = 24 * 3600;

export const soonAfterCure: Mistake = {
  number: 12,
  name: "Measured minutes after cure",
  asks: "Was a curing film scanned within a day of its cure, while it still relaxes and takes up water?",
  remedy: "Scan again after a day in the clean room, and say how long it stood.",
  falseAlarms: 0,
  judge({ film, post }) {
    const read = "time of the scan and of the cure";
    if (film?.cures === false) return notSeen(read, "The film does not cure.");
    if (typeof film?.curedAt !== "number" || typeof post?.at !== "number")
      return cannotTell(read, "The time of the cure or of the scan is not there.");
    const after = post.at - film.curedAt;
    const figure = { label: "Scan after cure", value: after, unit: "s" as const };
    if (after < 0) return cannotTell(read, "The scan was taken before the cure: one of the times is wrong.", figure);
    return after < SETTLED_AFTER
      ? seen(read, `The scan was taken ${time(after)} after the cure, while the film still moves.`, figure)
      : notSeen(read, `The scan was taken ${time(after)} after the cure.`, figure);
  },
};

/** Ratio of film thicknesses up to which a monitor's stress is carried over. Common practice, no source. */
const CARRIED_OVER = 1.5;

export const otherFilmThickness: Mistake = {
  number: 13,
  name: "Monitor at 1 µm used for 5 µm",
  asks: "Is the film of the monitor much thinner or thicker than the film that the stress is used for?",
  remedy: "Measure a monitor with the film as thick as in the flow.",
  falseAlarms: 0,
  judge({ film }) {
    const read = "film thickness of the monitor and in use";
    if (!film || typeof film.usedAt !== "number" || film.usedAt <= 0 || film.thickness <= 0)
      return cannotTell(read, "Where the stress is to be used is not there.");
    const ratio = film.usedAt / film.thickness;
    const figure = { label: "Thickness in use over the monitor's", value: ratio, unit: "1" as const };
    const um = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 3, trim: true });
    return ratio > CARRIED_OVER || ratio < 1 / CARRIED_OVER
      ? seen(
          read,
          `Measured at ${um(film.thickness)}, used at ${um(film.usedAt)}: stress changes with thickness.`,
          figure,
        )
      : notSeen(read, "The monitor's film is about as thick as the one in use.", figure);
  },
};

/** Days of the calendar as whole numbers that order them. */
const rank = ({ year, month, day }: CalendarDay) => (year * 100 + month) * 100 + day;

export const dayAndMonth: Mistake = {
  number: 14,
  name: "Day and month exchanged",
  asks: "Does the date lie outside the time in which the scan must have been taken, and inside it with day and month exchanged?",
  remedy: "Say in which order the file writes day and month.",
  falseAlarms: 0,
  judge({ date }) {
    const read = "date of the file and the time that it must lie in";
    if (!date) return cannotTell(read, "No date is there.");
    const { read: day, earliest, latest } = date;
    if (day.day > 12 || day.day === day.month) return notSeen(read, "Day and month cannot be exchanged in this date.");
    if (!earliest && !latest) return cannotTell(read, "Nothing says when the scan must have been taken.");
    const fits = (d: CalendarDay) => (!earliest || rank(d) >= rank(earliest)) && (!latest || rank(d) <= rank(latest));
    const [asRead, exchanged] = [fits(day), fits({ ...day, day: day.month, month: day.day })];
    const figure = null;
    if (!asRead && exchanged) return seen(read, "The date fits only with day and month exchanged.", figure);
    if (asRead && exchanged) return cannotTell(read, "The date fits either way.", figure);
    return asRead
      ? notSeen(read, "The date fits as it was read.", figure)
      : cannotTell(read, "The date fits neither way.", figure);
  },
};

/** Fewest slots from which an order can be told, and standard deviations by which one order must fit better. */
const FEWEST_SLOTS = 6;
const BETTER_BY = 4;

export const slotsReversed: Mistake = {
  number: 15,
  name: "Slot order reversed",
  asks: "Do the figures of a lot fit what was expected of its slots better from the last slot to the first?",
  remedy: "Say from which end the tool counts its slots.",
  falseAlarms: 0.002,
  judge({ slots }) {
    const read = "figure of each slot against the expected one, both ways";
    if (!slots || slots.length < FEWEST_SLOTS) return cannotTell(read, "Too few slots have an expected figure.");
    const expected = slots.map((slot) => slot.expected);
    const measured = slots.map((slot) => slot.measured);
    const [forward, backward] = [correlation(measured, expected), correlation(measured.toReversed(), expected)];
    if (forward === null || backward === null) return cannotTell(read, "All slots have the same figure.");
    const figure = { label: "Correlation from the last slot to the first", value: backward, unit: "1" as const };
    // Fisher's transform makes a correlation normal with 1/(n − 3) of variance.
    const better = (fisher(backward) - fisher(forward)) / Math.sqrt(2 / (slots.length - 3));
    if (better > BETTER_BY && backward > 0.5)
      return seen(read, "The figures fit the lot from its last slot to its first.", figure);
    return better < -BETTER_BY
      ? notSeen(read, "The figures fit the lot in the order given.", figure)
      : cannotTell(read, "The figures do not tell one order from the other.", figure);
  },
};

const fisher = (r: number) => Math.atanh(Math.max(-0.999999, Math.min(0.999999, r)));

function correlation(a: readonly number[], b: readonly number[]): number | null {
  const mean = (values: readonly number[]) => values.reduce((sum, v) => sum + v, 0) / values.length;
  const [meanA, meanB] = [mean(a), mean(b)];
  let [aa, bb, ab] = [0, 0, 0];
  a.forEach((value, n) => {
    const [x, y] = [value - meanA, (b[n] ?? 0) - meanB];
    aa += x * x;
    bb += y * y;
    ab += x * y;
  });
  return aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : null;
}

/** How far from the rim a notch reaches into a scan, and from how many times the scatter a dip counts, m and 1. */
const NOTCH_REACH = 6e-3;
const DIP = 20;
const LEAST_DIP = 0.5e-6;

export const notchInScan: Mistake = {
  number: 16,
  name: "Notch inside the scan",
  asks: "Does the scan run across the notch: a gap or a deep dip near one end, inside the edge exclusion that was chosen?",
  remedy: "Leave out more at the edge, or scan beside the notch.",
  falseAlarms: 0.002,
  judge({ pre, post, wafer, edgeExclusion = USUAL_EXCLUSION }) {
    const read = "gaps and dips near the ends of the scans";
    const scans = [pre, post].filter((scan) => !!scan);
    if (scans.length === 0) return cannotTell(read, "No scan is there.");
    for (const scan of scans) {
      const fit = fitScan(scan, { edgeExclusion, robust: true });
      const [first, last] = [fit.gaps, fit.runs].flat().length === 0 ? [0, 0] : rangeOf(scan.x);
      const rim = wafer ? wafer.diameter / 2 : Number.POSITIVE_INFINITY;
      const nearEnd = (from: number, to: number) =>
        Math.min(from - Math.max(first, -rim), Math.min(last, rim) - to) < NOTCH_REACH;
      const dip = fit.runs.find(
        ({ from, to, height }) =>
          nearEnd(from, to) &&
          height < -Math.max(DIP * fit.scatter.standardDeviation, LEAST_DIP) &&
          sharpEdge(scan, fit, from, to) > -height / 3,
      );
      const gap = fit.gaps.find(({ from, to }) => nearEnd(from, to));
      const found = dip ?? gap;
      if (found)
        return seen(
          read,
          `${dip ? "A dip" : "A gap"} lies ${formatQuantity(Math.max(0, Math.min(found.from - first, last - found.to)), "length", { unit: "mm", decimals: 1 })} from the end of the scan: it runs across the notch.`,
          {
            label: dip ? "Depth of the dip" : "Width of the gap",
            value: dip ? -dip.height : found.to - found.from,
            unit: "m",
          },
        );
    }
    return notSeen(read, "No gap or dip lies near the ends of the scans.");
  },
};

/** Largest step between two neighbours at either end of a stretch, m: a shape bends away from its fit smoothly, a notch does not. */
function sharpEdge(scan: ScanColumns, fit: ProfileFit, from: number, to: number): number {
  const { x, z } = ascendingColumns("scan", scan);
  const [first, last] = [firstFrom(x, from), firstFrom(x, to)];
  const over = (n: number) => (z[n] ?? 0) - fittedHeight(fit, x[n] ?? 0);
  const step = (n: number) => (n > 0 && n < x.length ? Math.abs(over(n) - over(n - 1)) : 0);
  return Math.max(step(first), step(last + 1));
}

function rangeOf(x: ArrayLike<number>): [number, number] {
  let [low, high] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (let n = 0; n < x.length; n += 1) {
    low = Math.min(low, x[n] ?? 0);
    high = Math.max(high, x[n] ?? 0);
  }
  return [low, high];
}
