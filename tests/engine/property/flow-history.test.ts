/*
 * What a flow must keep, whatever the films.
 *
 *   σ     mean stress of a film       Pa
 *   ε_p   strain that it has flowed   1
 *   κ     curvature, bowl positive    1/m
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { FilmAddition, FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { filmStresses, settle } from "#app/engine/flow/settle.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { layerRows } from "../placed.ts";
import { addition, bondStep, debondStep, exact, film, flow, grindStep, step } from "../unit/flow-samples.ts";
import { between, logarithmic } from "./arbitraries.ts";

const limits = defaultLimits();
const walk = (input: FlowInput) => walkFlow(input, limits).steps;
const last = (input: FlowInput) => {
  const found = walk(input).at(-1);
  if (!found) throw new Error("the flow has a step");
  return found;
};

/** Equal to 1e-9, or to a picometre of bow where films cancel. */
function expectSame(found: number, wanted: number) {
  expect(Math.abs(found - wanted)).toBeLessThanOrEqual(1e-9 * Math.abs(wanted) + 1e-10);
}

function films(kind: "metal" | "inorganic", most = 6): fc.Arbitrary<FilmAddition[]> {
  const one = fc.record({
    side: fc.constantFrom("front" as const, "back" as const),
    thickness: logarithmic(50e-9, 8e-6),
    modulus: logarithmic(50e9, 250e9),
    expansion: between(1e-6, 24e-6),
    stress: between(-150e6, 150e6),
    yielding: logarithmic(100e6, 400e6),
    coverage: between(0.05, 1),
  });
  return fc.array(one, { minLength: 1, maxLength: most }).map((list) =>
    list.map(({ side, thickness, modulus, expansion, stress, yielding, coverage }, n) =>
      addition({
        side,
        coverage,
        thickness: exact(thickness),
        stress: exact(stress),
        film: film({
          id: `film ${n}`,
          kind,
          youngsModulus: exact(modulus),
          expansion: exact(expansion),
          yieldStress: kind === "metal" ? exact(yielding) : null,
        }),
      }),
    ),
  );
}

const held = fc.constantFrom("bare" as const, "film frame" as const);
const silicon = logarithmic(60, 775);

describe("metals that yield", () => {
  /** How far each metal flows in the last of some identical cycles, beyond what it has flowed up to then. */
  function flowsInLast(cycles: number, adds: FilmAddition[], thickness: number, heat: Partial<StepInput>): number[] {
    const steps = walk(flow([step({ adds }), ...Array.from({ length: cycles }, () => step(heat))], { thickness }));
    const [before, last] = steps.slice(-2).map(({ after }) => [...after.front, ...after.back]);
    return (before ?? []).map(({ plasticStrain }, n) => Math.abs(plasticStrain - (last?.[n]?.plasticStrain ?? NaN)));
  }
  // Strains are some 1e-3: 1e-6 is a thousandth of them.
  const still = (flows: number[]) => flows.length > 0 && flows.every((strain) => strain < 1e-6);

  it("shake down: a second identical cycle changes nothing in a metal by itself", () => {
    fc.assert(
      fc.property(films("metal", 1), silicon, between(320, 700), held, (adds, thickness, peakTemperature, planned) => {
        expect(flowsInLast(2, adds, thickness, { peakTemperature, planned })).toSatisfy(still);
      }),
    );
  });

  it("shake down together: metals that are thick against the silicon settle in the cycle after", () => {
    fc.assert(
      fc.property(films("metal"), silicon, between(320, 700), held, (adds, thickness, peakTemperature, planned) => {
        expect(flowsInLast(3, adds, thickness, { peakTemperature, planned })).toSatisfy(still);
      }),
    );
  });
});

describe("a walk", () => {
  it("leaves forces and moments in balance at every step, hot and cold", () => {
    fc.assert(
      fc.property(films("metal"), silicon, between(320, 700), (adds, thickness, peak) => {
        const { after } = last(flow([step({ adds, peakTemperature: peak }), bondStep()], { thickness }));
        for (const temperature of [298.15, peak]) {
          const { placed, solution } = settle(after, temperature, { metalHistory: true, heldFlat: false });
          const { midplaneStrain, curvature } = solution;
          let [force, moment, forces, moments] = [0, 0, 0, 0];
          for (const l of layerRows(placed)) {
            const strain = midplaneStrain - curvature * l.centre - l.freeStrain;
            const parts = Math.abs(midplaneStrain) + Math.abs(curvature * l.centre) + Math.abs(l.freeStrain);
            const own = (-curvature * l.stiffness * l.thickness ** 2) / 12;
            force += l.stiffness * strain;
            moment += l.stiffness * strain * l.centre + own;
            forces += l.stiffness * parts;
            moments += l.stiffness * parts * Math.abs(l.centre) + Math.abs(own);
          }
          expect(Math.abs(force)).toBeLessThanOrEqual(1e-12 * forces);
          expect(Math.abs(moment)).toBeLessThanOrEqual(1e-12 * moments);
        }
      }),
    );
  });

  it("does not mind the order of elastic layers on different sides, or of steps", () => {
    fc.assert(
      fc.property(films("inorganic"), silicon, (adds, thickness) => {
        const atOnce = last(flow([step({ adds })], { thickness }));
        const apart = last(
          flow(
            adds.map((one) => step({ adds: [one] })),
            { thickness },
          ),
        );
        expectSame(apart.released.linearCurvature, atOnce.released.linearCurvature);
      }),
    );
  });

  it("comes back to where it was when a film is added and taken off again", () => {
    fc.assert(
      fc.property(films("inorganic"), films("inorganic"), silicon, (adds, [extra], thickness) => {
        if (!extra) return;
        const other = { ...extra, film: { ...extra.film, id: "other" } };
        const plain = last(flow([step({ adds })], { thickness }));
        const removes = [{ side: other.side, filmId: "other", filmName: "Other" }];
        const back = last(flow([step({ adds }), step({ adds: [other] }), step({ removes })], { thickness }));
        expect(back.released.linearCurvature).toBe(plain.released.linearCurvature);
      }),
    );
  });

  it("ends the same thinned before bonding or after, while all is elastic", () => {
    const thin = (planned: StepInput["planned"]) => grindStep(80, null, { planned, groundFaceForce: exact(0) });
    fc.assert(
      fc.property(films("inorganic"), (adds) => {
        const first = last(flow([step({ adds }), thin("grinding tape"), bondStep()]));
        const then = last(flow([step({ adds }), bondStep(), thin("carrier")]));
        expectSame(then.atRoom?.linearCurvature ?? 0, first.atRoom?.linearCurvature ?? 1);
      }),
    );
  });

  it("gives back after debonding what thinning alone would have left, while all is elastic", () => {
    fc.assert(
      fc.property(films("inorganic"), logarithmic(30, 700), (adds, left) => {
        const grind = grindStep(left, null, { planned: "carrier", groundFaceForce: exact(0) });
        const through = last(flow([step({ adds }), bondStep(), grind, debondStep()]));
        const alone = last(flow([step({ adds }), { ...grind, planned: "grinding tape" }]));
        expectSame(through.released.linearCurvature, alone.released.linearCurvature);
      }),
    );
  });

  it("keeps every film's stress within its yield", () => {
    fc.assert(
      fc.property(films("metal"), silicon, between(320, 700), (adds, thickness, peak) => {
        const { after } = last(flow([step({ adds, peakTemperature: peak })], { thickness }));
        const settled = settle(after, 298.15, { metalHistory: true, heldFlat: false });
        for (const { film: found, stress } of filmStresses(settled)) {
          const most = found.addition.film.yieldStress?.value ?? 0;
          expect(Math.abs(stress)).toBeLessThanOrEqual(most * (1 + 1e-9));
        }
      }),
    );
  });
});
