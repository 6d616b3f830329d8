/*
 * Films with limits and patterns in a flow.
 *
 *   σ      mean stress of a film                     Pa
 *   κ      curvature, bowl positive                  1/m
 *   T_z    zero-stress temperature of a polymer      K
 */
import { describe, expect, it } from "vitest";
import type { FilmAddition, FilmInput } from "#app/engine/flow/model.ts";
import { filmStresses, settle } from "#app/engine/flow/settle.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { relative } from "../relative.ts";
import { addition, celsius, exact, film, flow, step, um } from "./flow-samples.ts";

const limits = defaultLimits();

describe("a polymer", () => {
  const T_Z = celsius(225);
  const polymer = (overrides: Partial<FilmInput> = {}) =>
    film({
      kind: "polymer",
      youngsModulus: exact(3e9),
      poissonsRatio: exact(0.35),
      expansion: exact(40e-6),
      ...overrides,
    });
  const thinFilm = (material: FilmInput) => addition({ film: material, thickness: exact(10e-9), stress: exact(30e6) });
  const stressAt = (material: FilmInput, temperature: number) => {
    const [made] = walkFlow(flow([step({ adds: [thinFilm(material)] })]), limits).steps;
    if (!made) throw new Error("the flow has a step");
    const settled = settle(made.after, temperature, { metalHistory: true, heldFlat: false });
    return filmStresses(settled)[0]?.stress ?? NaN;
  };

  // A film of 10 nm shares a millionth of the wafer's stiffness.
  it("falls in a line to zero at its zero-stress temperature, on thick silicon, and stays there", () => {
    const stated = polymer({ zeroStressTemperature: exact(T_Z) });
    expect(relative(stressAt(stated, celsius(25)), 30e6)).toBeLessThan(1e-5);
    // Silicon's own expansion bends the line by some per cent.
    expect(relative(stressAt(stated, celsius(125)), 15e6)).toBeLessThan(0.05);
    expect(Math.abs(stressAt(stated, T_Z))).toBeLessThan(1);
    expect(Math.abs(stressAt(stated, celsius(300)))).toBeLessThan(1);
  });

  it("falls with its expansion where nobody stated one, never into compression", () => {
    expect(stressAt(polymer(), celsius(100))).toBeGreaterThan(0);
    expect(stressAt(polymer(), celsius(100))).toBeLessThan(30e6);
    expect(Math.abs(stressAt(polymer(), celsius(300)))).toBeLessThan(1);
  });

  it("keeps nothing of it: back at 25 °C it pulls as before", () => {
    const cure = [step({ adds: [thinFilm(polymer())] }), step({ peakTemperature: celsius(300) })];
    const [before, after] = walkFlow(flow(cure), limits).steps;
    expect(relative(after?.filmStress[0]?.stress ?? 0, before?.filmStress[0]?.stress ?? 1)).toBeLessThan(1e-9);
  });

  it("is refused with a zero-stress temperature below 25 °C", () => {
    expect(() => stressAt(polymer({ zeroStressTemperature: exact(celsius(20)) }), celsius(25))).toThrow(
      /zeroStressTemperature/,
    );
  });
});

describe("lines and islands", () => {
  const bend = (pattern: FilmAddition["pattern"], overrides: Partial<FilmAddition> = {}) => {
    const cut = addition({ thickness: exact(um(3)), coverage: 1, ...overrides, ...(pattern ? { pattern } : {}) });
    const [made] = walkFlow(flow([step({ adds: [cut] })]), limits).steps;
    if (!made) throw new Error("the flow has a step");
    return made.released;
  };
  const lines = (lineWidth: number, direction = 0) => ({ kind: "lines", coverage: 0.5, lineWidth, direction }) as const;

  it("bend most along narrow lines", () => {
    const { unequal } = bend(lines(um(2)));
    expect(unequal?.curvatureX ?? 0).toBeGreaterThan(2 * Math.abs(unequal?.curvatureY ?? 1));
    expect(bend(lines(um(2))).disc.linearCurvature).toEqual({
      x: unequal?.principal.major,
      y: unequal?.principal.minor,
    });
  });

  it("turn with the lines", () => {
    const [along, across] = [bend(lines(um(2))).unequal, bend(lines(um(2), Math.PI / 2)).unequal];
    expect(relative(along?.curvatureX ?? 0, across?.curvatureY ?? 1)).toBeLessThan(1e-9);
    expect(relative(along?.curvatureY ?? 0, across?.curvatureX ?? 1)).toBeLessThan(1e-9);
  });

  it("bend as a film of their coverage when they are wide", () => {
    const wide = bend(lines(1)).unequal;
    const film50 = bend(null, { coverage: 0.5 }).linearCurvature;
    expect(relative(wide?.curvatureX ?? 0, film50)).toBeLessThan(1e-4);
    expect(relative(wide?.curvatureY ?? 0, film50)).toBeLessThan(1e-4);
  });

  it("are relieved on all sides when they are islands, alike in both directions", () => {
    const islands = (size: number) => bend({ kind: "islands", coverage: 0.5, size });
    expect(islands(um(5)).unequal).toBeUndefined();
    expect(islands(um(5)).linearCurvature).toBeLessThan(islands(1).linearCurvature / 2);
    expect(relative(islands(1).linearCurvature, bend(null, { coverage: 0.5 }).linearCurvature)).toBeLessThan(1e-4);
  });
});

describe("what a film has been through", () => {
  const copper = film({
    kind: "metal",
    youngsModulus: exact(117e9),
    poissonsRatio: exact(0.34),
    expansion: exact(16.7e-6),
    yieldStress: exact(200e6),
  });
  const plated = addition({ film: copper, thickness: exact(um(5)), stress: exact(10e6) });

  it("is told after every step: hottest, strain left, and the stress that it comes back with", () => {
    const heats = [
      step({ adds: [plated] }),
      step({ peakTemperature: celsius(225) }),
      step({ peakTemperature: celsius(100) }),
    ];
    const [made, cured, warmed] = walkFlow(flow(heats), limits).steps.map(({ filmStress }) => filmStress[0]);
    expect(made).toMatchObject({ state: "as deposited", plasticStrain: 0, hottest: celsius(25) });
    expect(cured).toMatchObject({ state: "after its hottest step", hottest: celsius(225) });
    // Plated near zero, it comes back from a cure in strong tension: shortened for good while hot.
    expect(cured?.plasticStrain ?? 0).toBeLessThan(0);
    expect(cured?.stress ?? 0).toBeGreaterThan(150e6);
    expect(warmed?.hottest).toBe(celsius(225));
    expect(relative(warmed?.plasticStrain ?? 0, cured?.plasticStrain ?? 1)).toBeLessThan(1e-12);
  });
});
