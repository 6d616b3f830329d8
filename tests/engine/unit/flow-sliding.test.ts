/*
 * A pair whose bonding material flows.
 *
 *   κ      curvature, bowl positive                    1/m
 *   D      biaxial bending stiffness M h³/12           N·m
 *   T_f    flow point: above it the plates slide       K
 *
 * Balances hold to rounding (1e-12); locking leaves out the adhesive's own bending stiffness, a millionth of the pair's.
 */
import { describe, expect, it } from "vitest";
import { lockTemperature, slides, type BondState } from "#app/engine/flow/bond.ts";
import type { BondingMaterialInput, FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { lockedState, settle } from "#app/engine/flow/settle.ts";
import { sameState } from "#app/engine/flow/state.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { laminateWorking } from "#app/engine/laminate/working.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { warpWorking } from "#app/engine/rules/warp-working.ts";
import { layerRows } from "../placed.ts";
import { relative } from "../relative.ts";
import {
  addition,
  adhesive,
  bondStep,
  carrier,
  celsius,
  debondStep,
  exact,
  film,
  flow,
  step,
  tool,
  um,
} from "./flow-samples.ts";

const limits = defaultLimits();
const T_F = celsius(150);

const thermoplastic = (overrides: Partial<BondingMaterialInput> = {}) =>
  adhesive({
    softening: exact(celsius(120)),
    flows: true,
    flowPoint: exact(T_F),
    bondTemperature: exact(celsius(180)),
    ...overrides,
  });
const glass = carrier({
  material: "glass",
  youngsModulus: exact(74e9),
  poissonsRatio: exact(0.2),
  expansion: exact(4e-6),
});

const pair = (
  later: StepInput[],
  material = thermoplastic(),
  films = [addition({ thickness: exact(um(3)) })],
): FlowInput => flow([step({ adds: films }), bondStep({ peakTemperature: celsius(180) }, material, glass), ...later]);
const states = (input: FlowInput) => walkFlow(input, limits).steps;
const lastOf = (input: FlowInput) => {
  const last = states(input).at(-1);
  if (!last) throw new Error("the flow has a step");
  return last;
};
const hot = (peak: number, overrides: Partial<StepInput> = {}) =>
  step({
    title: "Heat",
    planned: "carrier",
    peakTemperature: celsius(peak),
    equipment: tool({ atPeak: "free" }),
    ...overrides,
  });

describe("two plates that slide", () => {
  const lower = [
    { thickness: um(700), youngsModulus: 130e9, poissonsRatio: 0.28, cte: "silicon" as const },
    { thickness: um(5), youngsModulus: 100e9, poissonsRatio: 0.3, stress: 100e6 },
  ];
  const upper = [{ thickness: um(500), youngsModulus: 74e9, poissonsRatio: 0.2, stress: 50e6 }];

  it("share the mean of their own curvatures, weighed with their stiffnesses", () => {
    const [one, two] = [solveLaminate(lower), solveLaminate(upper)];
    const both = solveLaminate(lower, { slidingOn: upper });
    const expected =
      (one.bendingStiffness * one.curvature + two.bendingStiffness * two.curvature) /
      (one.bendingStiffness + two.bendingStiffness);
    expect(relative(both.curvature, expected)).toBeLessThan(1e-12);
    expect(relative(both.bendingStiffness, one.bendingStiffness + two.bendingStiffness)).toBeLessThan(1e-12);
  });

  it("leave the first stack free of force, bent by what the second needs", () => {
    const both = solveLaminate(lower, { slidingOn: upper });
    const forces = lower.map(({ thickness }, n) => thickness * (both.meanStress[n] ?? 0));
    expect(Math.abs((forces[0] ?? 0) + (forces[1] ?? 0))).toBeLessThan(1e-12 * Math.abs(forces[1] ?? 0));
  });

  it("show their working", () => {
    const working = laminateWorking(lower, { slidingOn: upper });
    expect(working.equation).toBe("sliding-pair");
    expect(working.result.value).toBe(solveLaminate(lower, { slidingOn: upper }).curvature);
    expect(working.from).toHaveLength(2);
  });
});

describe("a pair above its flow point", () => {
  it("is flat when the wafer has no films, however unlike the expansions", () => {
    const bare = lastOf(pair([hot(200)], thermoplastic(), []));
    expect(Math.abs(bare.atPeak?.linearCurvature ?? 1)).toBeLessThan(1e-12);
    const coupled = lastOf(pair([hot(200)], thermoplastic({ flowPoint: null }), []));
    expect(Math.abs(coupled.atPeak?.linearCurvature ?? 0)).toBeGreaterThan(1e-3);
  });

  it("shows in its working that it slides", () => {
    const { atPeak } = lastOf(pair([hot(200)]));
    if (!atPeak) throw new Error("a hot pair has a shape");
    const [laminate] = warpWorking(atPeak).from ?? [];
    expect(laminate?.equation).toBe("sliding-pair");
    expect(relative(laminate?.result.value ?? 0, atPeak.linearCurvature)).toBeLessThan(1e-12);
  });

  it("locks without a jump: the same curvature a moment before and after", () => {
    const { after } = lastOf(pair([]));
    const sliding = settle(after, T_F, { metalHistory: true, heldFlat: false });
    expect(sliding.slidingOn).not.toBeNull();
    const after2 = lockedState(sliding, false);
    const coupled = settle(after2, T_F - 1e-9, { metalHistory: true, heldFlat: false });
    expect(coupled.slidingOn).toBeNull();
    expect(relative(coupled.solution.curvature, sliding.solution.curvature)).toBeLessThan(1e-5);
  });

  it("locks flat on a tool that holds it flat", () => {
    const { after } = lastOf(pair([]));
    const sliding = settle(after, T_F, { metalHistory: true, heldFlat: true });
    const held = settle(lockedState(sliding, true), T_F - 1e-9, { metalHistory: true, heldFlat: false });
    // Let go at once, only the wafer's own films bend it, now against the whole pair.
    expect(Math.abs(held.solution.curvature)).toBeLessThan(Math.abs(sliding.solution.curvature));
    expect(held.solution.curvature * sliding.solution.curvature).toBeGreaterThan(0);
  });

  it("keeps what it locked in: the next identical heat changes nothing, less heat does not either", () => {
    const once = lastOf(pair([hot(200)]));
    const twice = lastOf(pair([hot(200), hot(200)]));
    const mild = lastOf(pair([hot(200), hot(100)]));
    const never = lastOf(pair([hot(100)]));
    const bow = ({ atRoom }: typeof once) => atRoom?.linearCurvature ?? NaN;
    expect(relative(bow(twice), bow(once))).toBeLessThan(1e-9);
    expect(relative(bow(mild), bow(once))).toBeLessThan(1e-9);
    expect(relative(bow(never), bow(once))).toBeGreaterThan(0.01);
  });

  it("gives the wafer back unchanged when it is debonded", () => {
    const bare = flow([step({ adds: [addition({ thickness: exact(um(3)) })] })]);
    const back = lastOf(pair([hot(200), debondStep({ planned: "bare", peakTemperature: celsius(200) })]));
    expect(relative(back.atRoom?.linearCurvature ?? 0, lastOf(bare).atRoom?.linearCurvature ?? 1)).toBeLessThan(1e-12);
  });

  it("lets its metal yield in balance with both plates", () => {
    const copper = film({
      kind: "metal",
      youngsModulus: exact(117e9),
      poissonsRatio: exact(0.34),
      expansion: exact(16.7e-6),
      yieldStress: exact(150e6),
    });
    const { after } = lastOf(pair([], thermoplastic(), [addition({ film: copper, thickness: exact(um(10)) })]));
    const { placed, solution, slidingOn } = settle(after, celsius(250), { metalHistory: true, heldFlat: false });
    const layers = layerRows(placed);
    const stress = layers.map(
      (l) => l.biaxialModulus * (solution.midplaneStrain - solution.curvature * l.centre - l.freeStrain),
    );
    const force = layers.map((l, n) => l.thickness * (stress[n] ?? 0));
    expect(Math.abs(force.reduce((sum, part) => sum + part, 0))).toBeLessThan(1e-9 * Math.abs(force[0] ?? 0));
    const plate = slidingOn?.[0]?.layer;
    const carried = plate ? (plate.biaxialModulus * plate.thickness ** 3 * solution.curvature) / 12 : 0;
    const own = layers.reduce(
      (sum, l, n) => sum + (force[n] ?? 0) * l.centre - (solution.curvature * l.biaxialModulus * l.thickness ** 3) / 12,
      0,
    );
    expect(relative(own, carried)).toBeLessThan(1e-9);
  });
});

describe("whether two locked pairs bend alike from here on", () => {
  const coming = (x: number, y: number): FlowInput => {
    const plain = pair([hot(200)], thermoplastic(), []);
    const incoming = { curvature: { x: exact(x), y: exact(y) }, filmShare: exact(1) };
    return { ...plain, wafer: { ...plain.wafer, incoming } };
  };

  it("asks what they rest at by direction too, since the mean can be the same", () => {
    const { after } = lastOf(coming(2e-2, -1e-2));
    const [bond] = after.bonds;
    if (!bond?.rest?.unequal) throw new Error("a pair whose directions differ rests by direction");
    const { rest } = bond;
    const resting = (at: BondState["rest"]) => ({ ...after, bonds: [{ ...bond, rest: at }] });
    expect(sameState(after, resting(structuredClone(rest)))).toBe(true);
    const {
      carrier: { x, y, xy },
    } = bond.rest.unequal;
    for (const change of [
      { x: y, y: x, xy },
      { x, y, xy: xy + 1e-9 },
    ]) {
      const unequal = { ...bond.rest.unequal, carrier: change };
      expect(sameState(after, resting({ ...rest, unequal }))).toBe(false);
    }
    expect(sameState(after, resting({ ...rest, unequal: undefined }))).toBe(false);
  });
});

describe("which bonding materials slide", () => {
  const bond = (material: BondingMaterialInput): BondState => ({
    carrier: glass,
    material,
    thickness: exact(um(40)),
    bondTemperature: celsius(180),
  });

  it("only a thermoplastic at or above a flow point that somebody stated", () => {
    expect(slides(bond(thermoplastic()), T_F)).toBe(true);
    expect(slides(bond(thermoplastic()), T_F - 0.01)).toBe(false);
    expect(slides(bond(thermoplastic({ flowPoint: null })), celsius(250))).toBe(false);
    expect(slides(bond(thermoplastic({ flows: false })), celsius(250))).toBe(false);
  });

  it("lock at the flow point, else the glass transition, else the softening point, never above the bonding temperature", () => {
    expect(lockTemperature(bond(thermoplastic()))).toBe(T_F);
    expect(lockTemperature(bond(thermoplastic({ flowPoint: null })))).toBe(celsius(120));
    expect(lockTemperature(bond(thermoplastic({ flowPoint: null, glassTransition: exact(celsius(90)) })))).toBe(
      celsius(90),
    );
    expect(lockTemperature(bond(adhesive()))).toBe(celsius(180));
  });

  it("say so where a thermoplastic has no flow point and the step reaches its softening point", () => {
    expect(lastOf(pair([hot(200)], thermoplastic({ flowPoint: null }))).remarks).toEqual([
      expect.stringContaining("without a flow point"),
    ]);
    expect(lastOf(pair([hot(100)], thermoplastic({ flowPoint: null }))).remarks).toEqual([]);
    expect(lastOf(pair([hot(200)])).remarks).toEqual([]);
  });
});
