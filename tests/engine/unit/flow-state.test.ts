import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { layersOf } from "#app/engine/flow/layers.ts";
import { applyStep, initialState, type WaferState } from "#app/engine/flow/state.ts";
import type { StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import {
  addition,
  bondStep,
  celsius,
  debondStep,
  exact,
  film,
  flow,
  frameStep,
  grindStep,
  step,
  tapeStep,
  um,
} from "./flow-samples.ts";

const after = (steps: StepInput[], from: WaferState = initialState(flow([]))) =>
  steps.reduce((state, next, index) => applyStep(state, next, `steps[${index}]`), from);
const names = (state: WaferState) => state.front.map(({ addition: { film: material } }) => material.name);
const named = (name: string, more = {}) => addition({ film: film({ id: name, name }), ...more });

describe("the wafer between steps", () => {
  it("starts bare, device side up, as thick as it comes in", () => {
    expect(initialState(flow([]))).toMatchObject({ bonds: [], mount: null, faceUp: "device side", ground: false });
    expect(initialState(flow([])).silicon.value).toBeCloseTo(um(725), 12);
  });

  it("stacks films outwards on their side", () => {
    const state = after([step({ adds: [named("A")] }), step({ adds: [named("B"), named("C", { side: "back" })] })]);
    expect(names(state)).toEqual(["A", "B"]);
    expect(state.back).toHaveLength(1);
  });

  it("takes off the outermost film of a material, then adds what the step adds", () => {
    const state = after([
      step({ adds: [named("A"), named("B"), named("A", { coverage: 0.5 })] }),
      step({ removes: [{ side: "front", filmId: "A", filmName: "A" }], adds: [named("C")] }),
    ]);
    expect(names(state)).toEqual(["A", "B", "C"]);
    expect(state.front[0]?.addition.coverage).toBe(1);
  });

  it("leaves alone a film that is not there, on the other side, or of another material", () => {
    const state = after([
      step({ adds: [named("A")] }),
      step({
        removes: [
          { side: "back", filmId: "A", filmName: "A" },
          { side: "front", filmId: "B", filmName: "B" },
        ],
      }),
    ]);
    expect(names(state)).toEqual(["A"]);
  });

  it("thins, never grows", () => {
    expect(after([tapeStep(), grindStep(100, 3)])).toMatchObject({ silicon: { value: um(100) }, ground: true });
    expect(after([tapeStep(), grindStep(100, 3), grindStep(200, 3)]).silicon.value).toBe(um(100));
  });

  it.each([0, -1e-6])("refuses to leave %s m of silicon, naming the step", (value) => {
    const none = () => after([step(), step({ siliconAfter: exact(value) })]);
    expect(none).toThrow(EngineInputError);
    expect(none).toThrow(/steps\[1\]\.siliconAfter/);
  });

  it("bonds at the step's temperature and turns the back side up, until the debond", () => {
    const bonded = after([bondStep({ peakTemperature: celsius(180) })]);
    expect(bonded).toMatchObject({ faceUp: "back side", bonds: [{ bondTemperature: celsius(180) }] });
    expect(after([bondStep(), debondStep()])).toMatchObject({ bonds: [], faceUp: "device side" });
  });

  it("keeps tape and frame until something else holds the wafer", () => {
    expect(after([tapeStep()])).toMatchObject({ mount: "grinding tape", faceUp: "back side" });
    expect(after([tapeStep(), frameStep()])).toMatchObject({ mount: "film frame", faceUp: "device side" });
    expect(after([frameStep({ planned: "edge ring" })]).mount).toBe("edge ring");
    expect(after([tapeStep(), step()]).mount).toBeNull();
    expect(after([tapeStep(), bondStep()]).mount).toBeNull();
    expect(after([bondStep(), frameStep({ planned: "carrier" }), debondStep()]).mount).toBe("film frame");
  });

  it("keeps the force of a ground face until a step changes it", () => {
    const ground = grindStep(100, 3, { groundFaceForce: exact(-60) });
    expect(after([tapeStep(), ground, frameStep()]).groundFaceForce).toBe(-60);
    expect(after([tapeStep(), ground, step({ groundFaceForce: exact(0) })]).groundFaceForce).toBe(0);
  });

  it("lays the damaged depth of a ground face into the silicon, not on top of it", () => {
    const ground = after([tapeStep(), grindStep(100, 3, { groundFaceForce: exact(-60) })]);
    const layers = layersOf(ground, 298.15, []).entries.map(({ stated }) => stated);
    expect(layers.reduce((sum, { thickness }) => sum + thickness, 0)).toBeCloseTo(um(100), 12);
    const force = layers.reduce(
      (sum, { stress, thickness }) => sum + (typeof stress === "number" ? stress : 0) * thickness,
      0,
    );
    expect(force).toBeCloseTo(-60, 9);
  });
});

describe("what cannot be computed", () => {
  it("is refused with the step and with what to look at, in words that somebody typed", () => {
    const gel = film({ youngsModulus: exact(1e4) });
    const absurd = addition({ film: gel, thickness: exact(1e-3), stress: exact(1e10) });
    const walk = () => walkFlow(flow([step(), step({ siliconAfter: exact(um(1)), adds: [absurd] })]), defaultLimits());
    expect(walk).toThrow(/^steps\[1\]: the films would bend the wafer beyond anything/);
  });
});

describe("a wafer that is held flat", () => {
  const copper = film({
    kind: "metal",
    youngsModulus: exact(117e9),
    poissonsRatio: exact(0.34),
    expansion: exact(16.7e-6),
    yieldStress: exact(200e6),
  });
  const thin = [
    tapeStep({ adds: [addition({ film: copper, thickness: exact(um(5)), stress: exact(20e6) })] }),
    grindStep(20, 1, { groundFaceForce: exact(0) }),
  ];
  const strainLeft = (last: StepInput) =>
    walkFlow(flow([...thin, last]), defaultLimits()).steps.at(-1)?.after.front[0]?.plasticStrain ?? 0;
  const hot = { peakTemperature: celsius(200) };

  it("keeps its metal from bending away from the silicon, so it yields more when it is heated", () => {
    const flat = strainLeft(step({ ...hot, planned: "film frame" }));
    const free = strainLeft(step({ ...hot, planned: "bare" }));
    // Compression while hot shortens the metal for good: negative.
    expect(flat).toBeLessThan(0);
    expect(flat).toBeLessThan(free);
  });

  it("has the shape of the stack let go when it is asked for that", () => {
    const [flat] = walkFlow(flow([...thin, step({ planned: "film frame" })]), defaultLimits()).steps.slice(-1);
    const [free] = walkFlow(flow([...thin, step({ planned: "bare" })]), defaultLimits()).steps.slice(-1);
    expect(flat?.atRoom).toBeNull();
    expect(flat?.released.linearCurvature).toBeCloseTo(free?.atRoom?.linearCurvature ?? 0, 6);
  });
});
