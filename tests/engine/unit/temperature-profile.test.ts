/*
 *   T   temperature   K, written in °C here
 *   t   time          s, written in min here
 */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import type { StepInput } from "#app/engine/flow/model.ts";
import {
  profileHeat,
  timeAbove,
  timesReached,
  turningTemperatures,
  withPeak,
  type TemperatureProfile,
} from "#app/engine/flow/temperature-profile.ts";
import { exposureTime } from "#app/engine/rules/resistance.ts";
import { addition, adhesive, bondStep, celsius, exact, film, findings, flow, step } from "./flow-samples.ts";

const inMinutes = (...points: [time: number, degrees: number][]): TemperatureProfile =>
  points.map(([time, degrees]) => ({ time: time * 60, temperature: celsius(degrees) }));

const profiled = (profile: TemperatureProfile, overrides: Partial<StepInput> = {}) =>
  step({ kind: "anneal", planned: "carrier", ...overrides, profile, ...profileHeat(profile) });

const SLOW = inMinutes([0, 25], [30, 150], [60, 150], [90, 230], [120, 25]);

describe("what follows from a profile", () => {
  it("takes its hottest point as peak and the time within 5 K of it as time at peak", () => {
    const { peakTemperature, holdTime } = profileHeat(inMinutes([0, 25], [10, 225], [20, 230], [30, 230], [40, 130]));
    expect(peakTemperature).toBe(celsius(230));
    // 10 min from 225 to 230 °C, 10 min there, and 5 K of the 100 K that it falls by in 10 min.
    expect(holdTime).toBeCloseTo((10 + 10 + 0.5) * 60, 3);
  });

  it("counts the time at or above a temperature, ramps included, and the time at peak alone without a profile", () => {
    expect(timeAbove(profiled(SLOW), celsius(150))).toBeCloseTo((30 + 30 + (30 * 80) / 205) * 60, 3);
    expect(timeAbove(profiled(SLOW), celsius(231))).toBe(0);
    expect(timeAbove(step({ peakTemperature: celsius(230), holdTime: 600 }), celsius(150))).toBe(600);
    expect(timeAbove(step({ peakTemperature: celsius(230) }), celsius(150))).toBeNull();
    expect(timeAbove(step({ peakTemperature: celsius(100) }), celsius(150))).toBe(0);
  });

  it("counts how often it comes up to a temperature", () => {
    const twice = profiled(inMinutes([0, 25], [10, 245], [20, 100], [30, 245], [40, 25]));
    expect(timesReached(twice, celsius(217))).toBe(2);
    expect(timesReached(twice, celsius(100))).toBe(1);
    expect(timesReached(twice, celsius(245))).toBe(2);
    expect(timesReached(twice, celsius(246))).toBe(0);
    expect(timesReached(step({ peakTemperature: celsius(245) }), celsius(217))).toBe(1);
  });

  it("settles where the profile turns, whatever it does in between", () => {
    const celsiusOf = (profile: TemperatureProfile) =>
      turningTemperatures(profiled(profile)).map((kelvin) => Math.round(kelvin - 273.15));
    expect(celsiusOf(SLOW)).toEqual([230]);
    expect(celsiusOf(inMinutes([0, 25], [10, 200], [20, 100], [25, 100], [30, 150], [40, 25]))).toEqual([
      200, 100, 150,
    ]);
    expect(celsiusOf(inMinutes([0, 80], [10, 200]))).toEqual([200]);
    expect(celsiusOf(inMinutes([0, 25], [10, 25]))).toEqual([25]);
    expect(celsiusOf(inMinutes([0, 25], [10, -40], [20, 25]))).toEqual([-40, 25]);
  });

  it("stretches to another peak above 25 °C and leaves what lies below", () => {
    const hotter = withPeak(profiled(inMinutes([0, -40], [10, 125], [20, 225], [30, 25])), celsius(325));
    expect(hotter.profile?.map(({ temperature }) => Math.round(temperature - 273.15))).toEqual([-40, 175, 325, 25]);
    expect(withPeak(profiled(inMinutes([0, 25], [9, 25])), celsius(100))).toMatchObject({ profile: null });
    expect(withPeak(step(), celsius(100))).toEqual(step({ peakTemperature: celsius(100) }));
  });
});

describe("a profile that cannot be", () => {
  it.each([
    ["one point", inMinutes([0, 25]), "profile"],
    ["time that stands still", inMinutes([0, 25], [10, 100], [10, 200]), "profile[2].time"],
    ["a temperature below absolute zero", inMinutes([0, 25], [10, -300]), "profile[1].temperature"],
  ])("is refused with its place: %s", (_name, profile, field) => {
    const run = () => turningTemperatures({ profile, peakTemperature: celsius(25), holdTime: 0 });
    expect(run).toThrow(EngineInputError);
    expect(run).toThrow(expect.objectContaining({ field }) as Error);
  });

  it("is refused where the step says another peak", () => {
    const step = { profile: SLOW, peakTemperature: celsius(229), holdTime: 0 };
    expect(() => turningTemperatures(step)).toThrow(expect.objectContaining({ field: "peakTemperature" }) as Error);
  });
});

describe("rules that ask for a time", () => {
  const stands = (minutes: number) => adhesive({ thermalTime: exact(minutes * 60) });
  const bonded = (material = adhesive(), ...after: StepInput[]) => flow([bondStep({}, material), ...after]);

  it("add the time that the bond is hot, ramps included", () => {
    // Hot counts from 100 °C on by default: 12 of 30 min up to 150 °C, 60 min there and up to 230 °C, 19.0 min of the way down.
    const [below] = findings(bonded(stands(92), profiled(SLOW)), 6).filter(({ reason }) =>
      /up since the bond/.test(reason),
    );
    expect(below).toBeUndefined();
    const [beyond] = findings(bonded(stands(91), profiled(SLOW)), 6).filter(({ reason }) =>
      /up since the bond/.test(reason),
    );
    expect(beyond).toMatchObject({ outcome: "do not run" });
  });

  it("count two heatings in one step", () => {
    const twice = inMinutes([0, 25], [10, 200], [20, 40], [30, 200], [40, 25]);
    const heatings = (cycles: number) =>
      findings(bonded(adhesive({ thermalCycles: exact(cycles) }), profiled(twice)), 6).filter(({ reason }) =>
        reason.startsWith("Heating"),
      );
    expect(heatings(1)).toMatchObject([{ outcome: "do not run", figures: [{ value: 2 }] }]);
    expect(heatings(2)).toMatchObject([{ outcome: "caution" }]);
    expect(heatings(3)).toEqual([]);
  });

  it("hold the time near the adhesive's limit against what that is for", () => {
    const near = (minutes: number) =>
      findings(bonded(adhesive({ limitTime: exact(minutes * 60) }), profiled(SLOW)), 6).filter(({ reason }) =>
        reason.includes("near its limit"),
      );
    // Within 20 K of 250 °C only at 230 °C itself, for a moment.
    expect(near(1)).toEqual([]);
    const stay = profiled(inMinutes([0, 25], [30, 240], [60, 240], [90, 25]));
    const found = findings(bonded(adhesive({ limitTime: exact(1800) }), stay), 6);
    expect(found.some(({ reason, outcome }) => outcome === "do not run" && reason.includes("near its limit"))).toBe(
      true,
    );
  });

  it("count each melting of solder", () => {
    const solder = film({ kind: "solder", solderMelting: exact(celsius(217)), temperatureLimit: exact(celsius(300)) });
    const twice = inMinutes([0, 25], [10, 245], [20, 100], [30, 245], [40, 25]);
    const reflow = (profile: TemperatureProfile) => profiled(profile, { kind: "reflow", planned: "bare" });
    const input = flow([step({ adds: [addition({ film: solder })] }), reflow(twice), reflow(twice)]);
    expect(findings(input, 11).some(({ reason }) => reason.includes("melts for the 4th time"))).toBe(true);
  });

  it("take an exposure without a time of its own as long as the whole profile", () => {
    expect(exposureTime(profiled(SLOW, { exposures: ["vacuum"] }), "vacuum")).toBe(7200);
    expect(exposureTime(profiled(SLOW, { exposureTimes: { vacuum: 60 } }), "vacuum")).toBe(60);
    expect(exposureTime(step({ holdTime: 300 }), "vacuum")).toBe(300);
  });
});
