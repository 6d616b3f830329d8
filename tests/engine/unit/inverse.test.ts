/*
 * Inverse questions: the input at which a figure takes a value.
 *
 *   h      silicon thickness        m
 *   h_f    film thickness           m
 *   α      carrier expansion        1/K
 *
 * An answer put back into the model gives the target: 1e-3 is what is promised, rounding what is reached.
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { carrierExpansionFor, sagittaAfter, withCarrier } from "#app/engine/inverse/flow-questions.ts";
import { solveFor } from "#app/engine/inverse/solve-for.ts";
import { balancingFilm, leastThickness, mostFilm } from "#app/engine/inverse/stack-questions.ts";
import { answerInWords } from "#app/engine/inverse/words.ts";
import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import { withThickness, type StackInput } from "#app/engine/stack/model.ts";
import { curlingThickness } from "#app/engine/stack/thickness-sweep.ts";
import { relative } from "../relative.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";
import { um } from "./flow-samples.ts";

describe("solving for an input", () => {
  it("finds every root of a cubic, the one nearest to the start first", () => {
    const model = (x: number) => (x - 1) * (x - 2) * (x - 4);
    const up = solveFor({ model, from: 0, to: 5, target: 0 });
    const down = solveFor({ model, from: 5, to: 0, target: 0 });
    if (up.kind !== "answer" || down.kind !== "answer") throw new Error("a cubic has roots");
    [up.value, ...up.others].forEach((root, n) => expect(root).toBeCloseTo([1, 2, 4][n] ?? 0, 10));
    [down.value, ...down.others].forEach((root, n) => expect(root).toBeCloseTo([4, 2, 1][n] ?? 0, 10));
    expect(up.aboveAtFrom).toBe(false);
  });

  it("finds two roots closer than its first places", () => {
    const found = solveFor({ model: (x) => (x - 0.5003) * (x - 0.5007), from: 0, to: 1, target: 0 });
    if (found.kind !== "answer") throw new Error("there are roots");
    expect(found.value).toBeCloseTo(0.5003, 10);
    expect(found.others[0]).toBeCloseTo(0.5007, 10);
  });

  it("solves any rising power to the last digits", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 4, noNaN: true }),
        fc.double({ min: 0.02, max: 90, noNaN: true }),
        (power, root) => {
          const found = solveFor({
            model: (x) => x ** power,
            from: 0.01,
            to: 100,
            target: root ** power,
            logarithmic: true,
          });
          expect(found.kind === "answer" ? relative(found.value, root) : 1).toBeLessThan(1e-9);
        },
      ),
    );
  });

  it("says why there is none", () => {
    const square = { model: (x: number) => x * x + 1, from: -1, to: 2 };
    expect(solveFor({ ...square, target: 0 })).toMatchObject({ kind: "no answer", why: "always above" });
    expect(solveFor({ ...square, target: 9 })).toMatchObject({ why: "always below", most: { input: 2, value: 5 } });
    const refusing = () => {
      throw new EngineInputError("x", "no");
    };
    expect(solveFor({ ...square, model: refusing, target: 1 })).toMatchObject({
      why: "cannot be computed",
      least: null,
    });
    expect(() =>
      solveFor({
        ...square,
        model: () => {
          throw new TypeError("a fault");
        },
        target: 1,
      }),
    ).toThrow(TypeError);
  });

  it.each([
    { from: 1, to: 1 },
    { from: -1, to: 1, logarithmic: true },
    { from: NaN, to: 1 },
  ])("refuses %o", (range) => {
    expect(() => solveFor({ model: (x) => x, target: 0, ...range })).toThrow(EngineInputError);
  });

  it("passes over places where the figure does not exist", () => {
    const model = (x: number) => {
      if (x < 1) throw new EngineInputError("x", "too small");
      return x - 3;
    };
    expect(solveFor({ model, from: 0, to: 5, target: 0 })).toMatchObject({ kind: "answer", others: [] });
  });
});

const oxide = { youngsModulus: 70e9, poissonsRatio: 0.17, stress: -300e6, expansion: 0.5e-6 };
const stack = (films: StackInput["films"], thickness = um(725)): StackInput => ({
  wafer: { diameter: 0.2, orientation: "100", thickness },
  films,
});
const front = { ...oxide, side: "front" as const, thickness: um(1) };
const range = { thinnest: um(30), thickest: um(725) };

describe("a stack", () => {
  it("has a least thickness for a warp limit, thinner than which it bends more", () => {
    const found = leastThickness(stack([front]), um(300), range);
    if (found.kind !== "answer") throw new Error(answerInWords(found, words));
    expect(relative(estimateStack(stack([front], found.value)).shape.warp, um(300))).toBeLessThan(1e-9);
    expect(estimateStack(stack([front], found.value * 0.98)).shape.warp).toBeGreaterThan(um(300));
    expect(found.others).toEqual([]);
  });

  const words = {
    figure: "warp",
    input: "silicon thickness",
    figureDimension: "length",
    inputDimension: "length",
  } as const;

  it("says so where every thickness or none keeps the limit", () => {
    const weak = { ...front, stress: -1e3 };
    expect(answerInWords(leastThickness(stack([weak]), um(300), range), words)).toMatch(/below it everywhere/);
    const strong = { ...front, stress: -9e9 };
    expect(answerInWords(leastThickness(stack([strong]), um(1), range), words)).toMatch(/above it everywhere/);
  });

  it("has further roots where its films balance at one thickness", () => {
    const thick = { ...oxide, side: "front" as const, thickness: um(20), stress: 20e6 };
    const back = { ...oxide, side: "back" as const, thickness: um(1), stress: 450e6, youngsModulus: 250e9 };
    const balanced = stack([thick, back]);
    const warp = (h: number) => estimateStack(withThickness(balanced, h)).shape.warp;
    const found = leastThickness(balanced, um(60), { thinnest: um(15), thickest: um(725) });
    if (found.kind !== "answer") throw new Error(answerInWords(found, words));
    for (const root of [found.value, ...found.others]) expect(relative(warp(root), um(60))).toBeLessThan(1e-9);
    // From the thick end: everything above the answer keeps the limit.
    for (const share of [1.02, 1.2, 1.5]) expect(warp(Math.min(um(725), found.value * share))).toBeLessThan(um(60));
    if (found.others.length > 0) expect(answerInWords(found, words)).toMatch(/not monotone/);
  });

  it("curls below the thickness at which its load is critical", () => {
    const h = curlingThickness(stack([front]), um(725));
    expect(h).not.toBeNull();
    expect(relative(estimateStack(stack([front], h ?? 0)).shape.stabilityRatio, 1)).toBeLessThan(1e-9);
  });

  it("takes so much film and no more", () => {
    const thickness = mostFilm(stack([front]), { at: 0, quantity: "thickness" }, um(80), { from: um(0.1), to: um(20) });
    if (thickness.kind !== "answer") throw new Error("there is an answer");
    expect(relative(estimateStack(stack([{ ...front, thickness: thickness.value }])).shape.warp, um(80))).toBeLessThan(
      1e-9,
    );
    const stress = mostFilm(stack([front]), { at: 0, quantity: "stress" }, um(80), { from: 0, to: -5e9 });
    if (stress.kind !== "answer") throw new Error("there is an answer");
    expect(relative(estimateStack(stack([{ ...front, stress: stress.value }])).shape.warp, um(80))).toBeLessThan(1e-9);
    expect(() => mostFilm(stack([front]), { at: 3, quantity: "stress" }, um(80), { from: 0, to: 1 })).toThrow(/film/);
  });

  it("is flat with the back-side film that balances it, at that temperature alone", () => {
    const nitride = { youngsModulus: 180e9, poissonsRatio: 0.25, stress: -200e6, expansion: 3e-6 };
    const { answer, residual } = balancingFilm(
      stack([front]),
      nitride,
      { thinnest: um(0.05), thickest: um(10) },
      [298.15, 500],
    );
    if (answer.kind !== "answer") throw new Error("there is an answer");
    expect(answer.value).toBeGreaterThan(um(1));
    expect(Math.abs(residual[0]?.sagitta ?? 1)).toBeLessThan(1e-12);
    expect(Math.abs(residual[1]?.sagitta ?? 0)).toBeGreaterThan(um(0.1));
    const tensile = balancingFilm(
      stack([front]),
      { ...nitride, stress: 200e6 },
      { thinnest: um(0.05), thickest: um(10) },
    );
    expect(tensile).toMatchObject({ answer: { kind: "no answer" }, residual: [] });
  });
});

describe("a flow", () => {
  it("asks for the carrier whose pair has a bow after a step", () => {
    const { flow } = demoFlow("Petrel");
    const found = carrierExpansionFor(flow, 12, -um(217), { from: 2e-6, to: 4e-6 });
    if (found.kind !== "answer") throw new Error("there is an answer");
    // The fixture's glass has 3.0 ppm/K and 217 µm, to 8 % of bow and 117 µm per 0.1 ppm/K.
    expect(Math.abs(found.value - 3e-6)).toBeLessThan(0.02e-6);
    const back = withCarrier(flow, (carrier) => ({
      ...carrier,
      expansion: { value: found.value, tolerance: null, source: "assumed" },
    }));
    expect(relative(sagittaAfter(back, 12), -um(217))).toBeLessThan(1e-9);
  });

  it("has no answer beyond the range, before the bond, or where it is held flat", () => {
    const { flow } = demoFlow("Petrel");
    expect(carrierExpansionFor(flow, 12, 1, { from: 2e-6, to: 4e-6 })).toMatchObject({ kind: "no answer" });
    expect(() => carrierExpansionFor(flow, 3, 0)).toThrow(/before anything is bonded/);
    expect(() => carrierExpansionFor(flow, 99, 0)).toThrow(/not in the flow/);
    expect(() => carrierExpansionFor(flow, flow.steps.length, 0)).toThrow(/held flat/);
  });
});
