/* Workings of inverse questions and of the calibration: they carry the answer's own figure and rest on the figure that it gives. */
import { describe, expect, it } from "vitest";
import {
  balancingFilm,
  balancingFilmWorking,
  calibratePair,
  calibrationWorkings,
  carrierExpansionFor,
  carrierExpansionWorking,
  curlingThickness,
  curlingThicknessWorking,
  EQUATIONS,
  leastThickness,
  leastThicknessWorking,
  mostFilm,
  mostFilmWorking,
  sagittasAfter,
  withCalibration,
  type Calibrated,
  type InverseAnswer,
  type PairMeasurement,
  type StackInput,
  type Working,
} from "#app/engine/index.ts";
import { relative } from "../relative.ts";
import { addition, adhesive, bondStep, carrier, exact, flow, grindStep, step, um } from "./flow-samples.ts";

const oxide = { youngsModulus: 70e9, poissonsRatio: 0.17, stress: -300e6, expansion: 0.5e-6 };
const stack: StackInput = {
  wafer: { diameter: 0.2, orientation: "100", thickness: um(725) },
  films: [{ ...oxide, side: "front", thickness: um(1) }],
};
const range = { thinnest: um(30), thickest: um(725) };
const film = { at: 0, quantity: "thickness" } as const;
const back = { youngsModulus: 180e9, poissonsRatio: 0.25, stress: -200e6, expansion: 3e-6 };
const backRange = { thinnest: um(0.05), thickest: um(10) };
const glass = carrier({ youngsModulus: exact(74e9), poissonsRatio: exact(0.2), expansion: exact(3.4e-6) });
const pair = flow(
  [
    step({ adds: [addition({ thickness: exact(um(4)) })] }),
    bondStep({}, adhesive({ effectiveModulus: exact(0.3e9) }), glass),
    ...[300, 100].map((left) => grindStep(left, null, { planned: "carrier", groundFaceForce: exact(0) })),
  ],
  { diameter: 0.3, thickness: 775 },
);

const valueOf = (answer: InverseAnswer) => {
  if (answer.kind !== "answer") throw new Error("there is an answer");
  return answer.value;
};

const questions: [string, Working | null, number][] = [
  ["leastThickness", leastThicknessWorking(stack, um(300), range), valueOf(leastThickness(stack, um(300), range))],
  [
    "mostFilm",
    mostFilmWorking(stack, film, um(80), { from: um(0.1), to: um(20) }),
    valueOf(mostFilm(stack, film, um(80), { from: um(0.1), to: um(20) })),
  ],
  ["carrierExpansionFor", carrierExpansionWorking(pair, 4, -um(50)), valueOf(carrierExpansionFor(pair, 4, -um(50)))],
  ["curlingThickness", curlingThicknessWorking(stack, um(725)), curlingThickness(stack, um(725)) ?? NaN],
  [
    "balancingFilm",
    balancingFilmWorking(stack, back, backRange),
    valueOf(balancingFilm(stack, back, backRange).answer),
  ],
];

function expectComplete(working: Working) {
  for (const { equation, inputs, result } of [working, ...(working.from ?? [])]) {
    expect(EQUATIONS).toHaveProperty(equation);
    for (const { value, meaning } of [...inputs, result]) {
      expect(Number.isFinite(value)).toBe(true);
      expect(meaning).not.toBe("");
    }
    expect(new Set(inputs.map(({ symbol }) => symbol)).size).toBe(inputs.length);
  }
}

describe("the working of", () => {
  it.each(questions)("%s carries its answer and what is behind it", (_, working, value) => {
    if (!working) throw new Error("there is an answer");
    expect(working.result.value).toBe(value);
    expect(working.from?.length).toBeGreaterThan(0);
    expectComplete(working);
  });

  it("a limit rests on a shape with that warp", () => {
    const working = leastThicknessWorking(stack, um(300), range);
    // A bowl or a roll: the warp of a symmetric shape is its sagitta, signed by the curvature.
    expect(relative(Math.abs(working?.from?.[0]?.result.value ?? 0), um(300))).toBeLessThan(1e-9);
    expect(working?.note).toMatch(/^Silicon thickness \d/);
  });

  it("a question without an answer shows the figure that comes nearest, and why", () => {
    const working = leastThicknessWorking(
      { ...stack, films: [{ ...oxide, side: "front", thickness: um(1), stress: -1e3 }] },
      um(300),
      range,
    );
    if (!working) throw new Error("the warp can be computed");
    expectComplete(working);
    expect(working.result).toMatchObject({ symbol: "f", unit: "m" });
    expect(working.result.value).toBeLessThan(um(300));
    expect(working.note).toMatch(/^No answer: .* below it everywhere/);
    const tensile = balancingFilmWorking(stack, { ...back, stress: 200e6 }, backRange);
    expect(tensile).toBeNull();
    expect(curlingThicknessWorking({ ...stack, films: [] }, um(725))).toBeNull();
  });

  it("a wafer that rolls at its thickest says so", () => {
    const strong: StackInput = { ...stack, films: [{ ...oxide, side: "front", thickness: um(20), stress: -3e9 }] };
    expect(curlingThicknessWorking(strong, um(100))).toMatchObject({ result: { value: um(100) } });
    expect(curlingThicknessWorking(strong, um(100))?.note).toMatch(/thickest/);
  });

  it("a calibration carries the fitted values, their uncertainties and the bows", () => {
    const quantities: Calibrated[] = ["lockedInModulus", "carrierExpansion"];
    const truth = sagittasAfter(
      withCalibration(pair, [
        { quantity: "lockedInModulus", value: 0.12e9 },
        { quantity: "carrierExpansion", value: 3.1e-6 },
      ]),
    );
    const measured = [2, 3, 4].map((number): PairMeasurement => ({
      flow: pair,
      step: number,
      sagitta: (truth[number - 1] ?? NaN) + (number - 3) * um(1),
      standardUncertainty: um(2),
    }));
    const fitted = calibratePair(measured, quantities);
    const workings = calibrationWorkings(measured, quantities);
    if (fitted.kind !== "fitted") throw new Error(fitted.reason);
    expect(workings.map(({ result }) => result.value)).toEqual(fitted.values.map(({ value }) => value));
    for (const [n, working] of workings.entries()) {
      expectComplete(working);
      expect(working.inputs.at(-1)?.value).toBe(fitted.values[n]?.standardUncertainty);
    }
    // The fitted bow of the first measurement is what the walk behind it gives.
    const bow = workings[0]?.inputs.find(({ symbol }) => symbol === "f_1")?.value ?? NaN;
    expect(relative(workings[0]?.from?.[0]?.result.value ?? 0, bow)).toBeLessThan(1e-9);
    expect(calibrationWorkings(measured.slice(0, 1), quantities)).toEqual([]);
  });
});
