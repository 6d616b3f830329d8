/* Bad input to the directional laminate, patterns, own weight, chuck, strength, budget and die is refused by name. SI throughout. */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import {
  bendingStress,
  bumpCover,
  chuckFlattening,
  designStress,
  dieAfterDicing,
  directionalStoneyCurvature,
  failureProbability,
  flatChuckStress,
  flatChuckStressWorking,
  gravitySag,
  minimumBendRadius,
  patternedFilm,
  scaledStrength,
  solveDirectionalLaminate,
  thicknessBudget,
  type DirectionalLayer,
  type FilmPattern,
} from "#app/engine/index.ts";

const silicon: DirectionalLayer = { thickness: 725e-6, silicon: { direction: "110" } };
const metal = { thickness: 5e-6, youngsModulus: 117e9, poissonsRatio: 0.34, stress: 1e8 };
const lines = { kind: "lines" as const, coverage: 0.5, lineWidth: 1e-5, direction: 0 };
const wafer = { radius: 0.15, thickness: 775e-6, youngsModulus: 151e9, poissonsRatio: 0.16, density: 2329 };
const edgeRing = { kind: "edge-ring" as const };
const chuck = {
  radius: 0.15,
  thickness: 775e-6,
  biaxialModulus: 180e9,
  poissonsRatio: 0.16,
  curvature: 0.04,
  vacuum: 8e4,
};
const bend = { thickness: 50e-6, direction: "110" as const };
const weibull = { characteristicStrength: 5e8, weibullModulus: 6 };
const budget = { contributions: [{ name: "carrier", variation: 1e-6 }], finalThickness: 50e-6 };
const die = { layers: [silicon], length: 0.01, width: 0.01 };
/** What JavaScript callers may pass. */
const foreign = (json: string) => JSON.parse(json);

const refusals: [string, () => unknown][] = [
  ["layers", () => solveDirectionalLaminate([])],
  ["layers", () => solveDirectionalLaminate([{ ...metal, thickness: 0.1, pattern: { ...lines, lineWidth: 1e-10 } }])],
  ["layers", () => solveDirectionalLaminate([{ ...metal, coverage: 0 }])],
  ["layers[1].coverage", () => solveDirectionalLaminate([silicon, { ...metal, coverage: 0.5, pattern: lines }])],
  [
    "layers[1].pattern.coverage",
    () => solveDirectionalLaminate([silicon, { ...metal, pattern: { ...lines, coverage: 2 } }]),
  ],
  [
    "layers[1].pattern.lineWidth",
    () => solveDirectionalLaminate([silicon, { ...metal, pattern: { ...lines, lineWidth: 0 } }]),
  ],
  [
    "layers[1].pattern.direction",
    () => solveDirectionalLaminate([silicon, { ...metal, pattern: { ...lines, direction: 90 } }]),
  ],
  ["layers[1].stress.y", () => solveDirectionalLaminate([silicon, { ...metal, stress: { x: 1e8, y: Number.NaN } }])],
  [
    "layers[0].silicon.direction",
    () => solveDirectionalLaminate([{ ...silicon, silicon: { direction: foreign('"111"') } }]),
  ],
  [
    "layers[0].silicon.angle",
    () => solveDirectionalLaminate([{ ...silicon, silicon: { direction: "110", angle: 45 } }]),
  ],
  ["layers[0].thickness", () => solveDirectionalLaminate([{ ...silicon, thickness: -1 }])],
  ["layers[1].cte", () => solveDirectionalLaminate([silicon, metal], { temperature: 400 })],
  ["film.thickness", () => patternedFilm({ ...metal, thickness: 0, pattern: lines })],
  ["film.pattern.size", () => patternedFilm({ ...metal, pattern: { kind: "islands", coverage: 0.5, size: -1 } })],
  ["film.pattern.kind", () => patternedFilm({ ...metal, pattern: foreign('{"kind":"spiral"}') as FilmPattern })],
  [
    "force.x",
    () =>
      directionalStoneyCurvature({
        force: { x: Number.NaN, y: 0 },
        substrateThickness: 1e-4,
        youngsModulus: 1e11,
        poissonsRatio: 0.2,
      }),
  ],
  [
    "substrateThickness",
    () =>
      directionalStoneyCurvature({
        force: { x: 1, y: 0 },
        substrateThickness: 0,
        youngsModulus: 1e11,
        poissonsRatio: 0.2,
      }),
  ],
  ["radius", () => gravitySag({ ...wafer, radius: 0, support: edgeRing })],
  ["thickness", () => gravitySag({ ...wafer, thickness: 0.04, support: edgeRing })],
  ["poissonsRatio", () => gravitySag({ ...wafer, poissonsRatio: -0.1, support: edgeRing })],
  ["density", () => gravitySag({ ...wafer, density: 0, support: edgeRing })],
  ["gravity", () => gravitySag({ ...wafer, gravity: -9.8, support: edgeRing })],
  ["support.radius", () => gravitySag({ ...wafer, support: { kind: "ring", radius: 0.16 } })],
  ["support.radius", () => gravitySag({ ...wafer, support: { kind: "points", count: 3, radius: 0.2 } })],
  ["support.radius", () => gravitySag({ ...wafer, support: { kind: "centre-cup", radius: 0.15 } })],
  ["support.count", () => gravitySag({ ...wafer, support: { kind: "points", count: 2, radius: 0.1 } })],
  ["support.count", () => gravitySag({ ...wafer, support: { kind: "points", count: 3.5, radius: 0.1 } })],
  ["support.halfSpacing", () => gravitySag({ ...wafer, support: { kind: "rails", halfSpacing: 0.1499 } })],
  ["support.kind", () => gravitySag({ ...wafer, support: foreign('{"kind":"hook"}') })],
  ["curvature", () => chuckFlattening({ ...chuck, curvature: Number.NaN })],
  ["vacuum", () => chuckFlattening({ ...chuck, vacuum: -1 })],
  ["poissonsRatio", () => chuckFlattening({ ...chuck, poissonsRatio: 0.5 })],
  ["layers[1].youngsModulus", () => flatChuckStress([silicon, { ...metal, youngsModulus: 0 }])],
  ["layer", () => flatChuckStressWorking([silicon], 1)],
  ["radiusOfCurvature", () => bendingStress({ ...bend, radiusOfCurvature: 1e-6 })],
  ["direction", () => bendingStress({ thickness: 1e-4, radiusOfCurvature: 1, direction: foreign('"111"') })],
  ["stress", () => minimumBendRadius({ ...bend, stress: 0 })],
  ["edge", () => designStress(foreign('"chipped"'))],
  ["stress", () => failureProbability({ ...weibull, stress: Number.NaN })],
  ["weibullModulus", () => failureProbability({ ...weibull, weibullModulus: 0, stress: 1e8 })],
  ["area", () => scaledStrength({ ...weibull, referenceArea: 1e-5 })],
  ["referenceArea", () => scaledStrength({ ...weibull, area: 1e-5 })],
  ["contributions", () => thicknessBudget({ ...budget, contributions: [] })],
  [
    "contributions[0].variation",
    () => thicknessBudget({ ...budget, contributions: [{ name: "carrier", variation: -1e-6 }] }),
  ],
  ["finalThickness", () => thicknessBudget({ ...budget, finalThickness: 0 })],
  ["viaProtrusion", () => thicknessBudget({ ...budget, viaProtrusion: 0 })],
  ["bumpHeight", () => bumpCover({ bumpHeight: 0, adhesiveThickness: 1e-5 })],
  ["length", () => dieAfterDicing({ ...die, length: 0 })],
  ["temperatures", () => dieAfterDicing({ ...die, temperatures: [] })],
  ["temperatures[1]", () => dieAfterDicing({ ...die, temperatures: [300, -1] })],
];

describe("refusals", () => {
  it.each(refusals)("%s", (field, act) => {
    let thrown: unknown = null;
    try {
      act();
    } catch (error) {
      thrown = error;
    }
    expect(thrown).toBeInstanceOf(EngineInputError);
    expect(thrown).toMatchObject({ field });
  });
});
