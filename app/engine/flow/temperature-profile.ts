import { EngineInputError } from "../errors.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";

/** A point of a temperature profile: s from its beginning, K. Between two points the temperature runs in a straight line. */
export interface ProfilePoint {
  time: number;
  temperature: number;
}
export type TemperatureProfile = ProfilePoint[];

/** Within so many kelvin of the hottest a profile counts as at its peak, K (common practice, no source). */
export const AT_PEAK_WITHIN = 5;

/** A step's heat: peak (K) and time at it (s; null when it does not matter), and the profile that both follow from, if any. */
export interface StepHeat {
  peakTemperature: number;
  holdTime: number | null;
  profile?: TemperatureProfile | null;
}

/** Hottest of a profile, K, and how long it is within `AT_PEAK_WITHIN` of that, s. */
export function profileHeat(profile: TemperatureProfile): { peakTemperature: number; holdTime: number } {
  const peakTemperature = Math.max(...profile.map(({ temperature }) => temperature));
  return { peakTemperature, holdTime: timeFrom(profile, peakTemperature - AT_PEAK_WITHIN) };
}

/** How long the heat of a step lasts, s: its whole profile, else the time at its peak; null when nobody said. */
export function heatDuration({ profile, holdTime }: StepHeat): number | null {
  return profile ? (profile.at(-1)?.time ?? 0) - (profile[0]?.time ?? 0) : holdTime;
}

/**
 * Temperatures (K) at which a step settles, in order: where its profile turns, on the way from 25 °C and back to it; of one that only
 * cools, 25 °C last. A step without one settles at its peak.
 * @throws EngineInputError when the profile has fewer than two points, a time that does not grow, or another peak than the step
 */
export function turningTemperatures({ profile, peakTemperature }: StepHeat): [number, ...number[]] {
  if (!profile) return [peakTemperature];
  checkProfile(profile, peakTemperature);
  const way = [ROOM_TEMPERATURE, ...profile.map(({ temperature }) => temperature), ROOM_TEMPERATURE];
  // A plateau is one place: its end is no turn.
  const steps = way.filter((temperature, at) => temperature !== way[at - 1]);
  const turns = steps.filter((temperature, at) => {
    const [before, after] = [steps[at - 1], steps[at + 1]];
    return before !== undefined && after !== undefined && before < temperature !== temperature < after;
  });
  if (turns.every((temperature) => temperature <= ROOM_TEMPERATURE)) turns.push(ROOM_TEMPERATURE);
  const [first = ROOM_TEMPERATURE, ...rest] = turns;
  return [first, ...rest];
}

function checkProfile(profile: TemperatureProfile, peakTemperature: number): void {
  if (profile.length < 2) throw new EngineInputError("profile", "a profile has a beginning and an end", "two points");
  profile.forEach(({ time, temperature }, at) => {
    const before = profile[at - 1];
    if (!Number.isFinite(time) || (before && !(time > before.time)))
      throw new EngineInputError(
        `profile[${at}].time`,
        "each point of a profile comes after the one before",
        "s, growing",
      );
    if (!(temperature > 0) || !Number.isFinite(temperature))
      throw new EngineInputError(`profile[${at}].temperature`, "a profile goes through temperatures", "> 0 K");
  });
  if (profileHeat(profile).peakTemperature !== peakTemperature)
    throw new EngineInputError(
      "peakTemperature",
      "the peak of a profile is its hottest point",
      "that of the profile, K",
    );
}

/** Rounding error of a decimal temperature turned into SI, relative: 'at' a temperature must not depend on it. */
const SAME = 1e-9;

/** Time that a profile is at or above a temperature (K), s. */
function timeFrom(profile: TemperatureProfile, limit: number): number {
  const temperature = limit * (1 - SAME);
  return profile.slice(1).reduce((sum, to, at) => {
    const from = profile[at];
    if (!from) return sum;
    const [low, high] = [Math.min(from.temperature, to.temperature), Math.max(from.temperature, to.temperature)];
    if (high < temperature) return sum;
    const share = low >= temperature ? 1 : (high - temperature) / (high - low);
    return sum + share * (to.time - from.time);
  }, 0);
}

/**
 * How long a step is at or above a temperature (K), s: by its profile, else the time at its peak, ramps left out. null when it gets
 * there and nobody said for how long, 0 when it does not get there.
 */
export function timeAbove(step: StepHeat, temperature: number): number | null {
  if (step.profile) return timeFrom(step.profile, temperature);
  return step.peakTemperature < temperature * (1 - SAME) ? 0 : step.holdTime;
}

/** How often a step comes up to a temperature (K): once at most without a profile. */
export function timesReached({ profile, peakTemperature }: StepHeat, limit: number): number {
  const temperature = limit * (1 - SAME);
  if (!profile) return peakTemperature < temperature ? 0 : 1;
  return profile.filter(
    (point, at) => point.temperature >= temperature && (profile[at - 1]?.temperature ?? -Infinity) < temperature,
  ).length;
}

/**
 * The step with another peak (K). A profile is stretched above 25 °C in proportion, its times kept; one that never leaves 25 °C has
 * nothing to stretch and goes.
 */
export function withPeak<Step extends StepHeat>(step: Step, peakTemperature: number): Step {
  if (!step.profile) return { ...step, peakTemperature };
  const rise = step.peakTemperature - ROOM_TEMPERATURE;
  if (!(rise > 0)) return { ...step, peakTemperature, profile: null };
  const stretch = (peakTemperature - ROOM_TEMPERATURE) / rise;
  const profile = step.profile.map(({ time, temperature }) => ({
    time,
    // The hottest is the new peak to the last digit, whatever the product rounds to.
    temperature:
      temperature === step.peakTemperature
        ? peakTemperature
        : temperature > ROOM_TEMPERATURE
          ? ROOM_TEMPERATURE + (temperature - ROOM_TEMPERATURE) * stretch
          : temperature,
  }));
  return { ...step, profile, ...profileHeat(profile) };
}
