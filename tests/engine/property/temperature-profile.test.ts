/*
 * A profile against what it stands for.
 *
 *   T   temperature   K
 *   t   time          s
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { profileHeat, timeAbove, withPeak, type TemperatureProfile } from "#app/engine/flow/temperature-profile.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { DEMO_FLOWS, demoFlow } from "../../fixtures/demo-flow-input.ts";
import { addition, adhesive, bondStep, celsius, exact, film, flow, grindStep, step, um } from "../unit/flow-samples.ts";
import { between } from "./arbitraries.ts";

const limits = defaultLimits();
const walk = (input: FlowInput) => walkFlow(input, limits).steps;

/** Everything that the walk says of a wafer, without the step that it was told by. */
const told = (input: FlowInput) =>
  walk(input).map(({ after, atRoom, atPeak, released, lies, filmForce, filmStress }) => ({
    silicon: after.silicon.value,
    rests: after.bonds.map(({ rest }) => rest ?? null),
    bondedAt: after.bonds.map(({ bondTemperature }) => bondTemperature),
    room: atRoom && [atRoom.sagitta, atRoom.warp, atRoom.stabilityRatio],
    peak: atPeak && [atPeak.sagitta, atPeak.temperature],
    released: released.sagitta,
    lies,
    filmForce,
    filmStress,
  }));

const withProfile = (given: StepInput, profile: TemperatureProfile): StepInput => ({
  ...given,
  profile,
  ...profileHeat(profile),
});

/** Up from 25 °C over plateaus, a stay at the peak (none: a triangle), and down over plateaus. */
const trapezoid = fc.record({
  up: fc.array(between(0.01, 0.99), { maxLength: 3 }),
  down: fc.array(between(0.01, 0.99), { maxLength: 3 }),
  stay: fc.constantFrom(0, 600, 7200),
  start: fc.boolean(),
});

function profileTo(
  peak: number,
  { up, down, stay, start }: { up: number[]; down: number[]; stay: number; start: boolean },
) {
  const at = (share: number) => ROOM_TEMPERATURE + share * (peak - ROOM_TEMPERATURE);
  const temperatures = [
    ...(start ? [ROOM_TEMPERATURE] : []),
    ...up.toSorted((a, b) => a - b).flatMap((share) => [at(share), at(share)]),
    peak,
    ...(stay > 0 ? [peak] : []),
    ...down.toSorted((a, b) => b - a).map(at),
    ROOM_TEMPERATURE,
  ];
  return temperatures.map((temperature, n) => ({ time: n * 600, temperature }));
}

describe("a profile that only goes up and comes down again", () => {
  it.each(DEMO_FLOWS)("leaves %s as peak and minutes do, at every step", (name) => {
    const { flow: input } = demoFlow(name);
    const wanted = told(input);
    fc.assert(
      fc.property(trapezoid, (shape) => {
        const steps = input.steps.map((each) =>
          each.peakTemperature > ROOM_TEMPERATURE ? withProfile(each, profileTo(each.peakTemperature, shape)) : each,
        );
        expect(told({ ...input, steps })).toEqual(wanted);
      }),
      { numRuns: 8 },
    );
  });
});

const copper = addition({
  thickness: exact(um(5)),
  stress: exact(20e6),
  film: film({ kind: "metal", expansion: exact(17e-6), youngsModulus: exact(110e9), yieldStress: exact(180e6) }),
});
const plate = step({ kind: "plate", title: "Plate", adds: [copper] });
const slide = adhesive({ flows: true, flowPoint: exact(celsius(120)), softening: exact(celsius(100)) });
const pair = [plate, bondStep({}, slide), grindStep(100, null, { planned: "carrier" })];

const inMinutes = (...points: [time: number, degrees: number][]): TemperatureProfile =>
  points.map(([time, degrees]) => ({ time: time * 60, temperature: celsius(degrees) }));

describe("a profile that turns on its way", () => {
  it.each([
    ["a metal film by itself", [plate]],
    ["a pair that slides and locks again", pair],
  ])("does to %s what a step for each of its peaks does", (_name, before) => {
    fc.assert(
      fc.property(between(30, 240), between(30, 240), (first, second) => {
        fc.pre(Math.abs(first - second) > 1);
        const heat = (degrees: number) => step({ kind: "anneal", peakTemperature: celsius(degrees) });
        const twice = withProfile(
          step({ kind: "anneal" }),
          inMinutes([0, 25], [10, first], [20, 25], [30, second], [40, 25]),
        );
        const one = told(flow([...before, twice])).at(-1);
        const two = told(flow([...before, heat(first), heat(second)])).at(-1);
        expect(one?.room).toEqual(two?.room);
        expect(one?.rests).toEqual(two?.rests);
        expect(one?.filmStress).toEqual(two?.filmStress);
      }),
    );
  });

  it("stays sliding where it does not cool below the flow point in between", () => {
    const once = withProfile(step({ kind: "anneal" }), inMinutes([0, 25], [10, 200], [40, 25]));
    const dips = withProfile(step({ kind: "anneal" }), inMinutes([0, 25], [10, 200], [20, 150], [30, 200], [40, 25]));
    const elastic = [step({ adds: [addition()] }), ...pair.slice(1)];
    const [a, b] = [once, dips].map((each) => told(flow([...elastic, each])).at(-1));
    expect(a?.rests.map((rest) => rest?.temperature)).toEqual([celsius(120)]);
    expect(b?.room?.[0]).toBeCloseTo(a?.room?.[0] ?? NaN, 12);
  });

  it("makes a bond at its hottest: what comes before finds the wafer free", () => {
    const bonds = withProfile(bondStep(), inMinutes([0, 25], [10, 200], [20, 60], [30, 230], [40, 25]));
    const apart = [
      plate,
      step({ kind: "anneal", peakTemperature: celsius(200) }),
      bondStep({ peakTemperature: celsius(230) }),
    ];
    const one = told(flow([plate, bonds])).at(-1);
    const two = told(flow(apart)).at(-1);
    expect(one?.bondedAt).toEqual([celsius(230)]);
    expect(one?.filmStress.map(({ stress }) => Math.round(stress))).toEqual(
      two?.filmStress.map(({ stress }) => Math.round(stress)),
    );
  });
});

describe("time and peak of a profile", () => {
  const random = fc
    .array(fc.record({ time: between(1, 3600), temperature: between(250, 700) }), { minLength: 2, maxLength: 12 })
    .map((list) => {
      let time = 0;
      return list.map((point) => ({ time: (time += point.time), temperature: point.temperature }));
    });

  it("spends no more time above a higher temperature, and all of it above the lowest", () => {
    fc.assert(
      fc.property(random, between(200, 750), between(0, 100), (profile, temperature, more) => {
        const heat = { profile, ...profileHeat(profile) };
        const [low, high] = [timeAbove(heat, temperature) ?? 0, timeAbove(heat, temperature + more) ?? 0];
        expect(high).toBeLessThanOrEqual(low + 1e-9);
        expect(timeAbove(heat, 200)).toBeCloseTo((profile.at(-1)?.time ?? 0) - (profile[0]?.time ?? 0), 6);
      }),
    );
  });

  it("is stretched to another peak exactly, and back", () => {
    fc.assert(
      fc.property(random, between(310, 900), (profile, peak) => {
        const heat = { profile, ...profileHeat(profile) };
        fc.pre(heat.peakTemperature > ROOM_TEMPERATURE + 1);
        const hotter = withPeak(heat, peak);
        expect(hotter.peakTemperature).toBe(peak);
        const back = withPeak(hotter, heat.peakTemperature);
        back.profile?.forEach((point, at) => {
          expect(point.time).toBe(profile[at]?.time);
          expect(point.temperature).toBeCloseTo(profile[at]?.temperature ?? NaN, 8);
        });
      }),
    );
  });
});
