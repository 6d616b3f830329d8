/* Workings of the directional laminate, patterns, own weight, chuck, strength, budget and die: they carry the calculation's own figure. */
import { describe, expect, it } from "vitest";
import {
  bendingStress,
  bendingStressWorking,
  bumpCover,
  bumpCoverWorking,
  chuckFlattening,
  chuckPressureWorking,
  chuckRimLiftWorking,
  chuckSurfaceStressWorking,
  dieAfterDicing,
  dieWarpWorking,
  directionalLaminateWorking,
  directionalStoneyCurvature,
  directionalStoneyWorking,
  edgeReliefWorking,
  EQUATIONS,
  failureProbability,
  failureProbabilityWorking,
  flatChuckStress,
  flatChuckStressWorking,
  gravitySag,
  gravitySagWorking,
  largeSagWorking,
  minimumBendRadius,
  minimumBendRadiusWorking,
  patternedFilm,
  patternedFilmWorking,
  scaledStrength,
  scaledStrengthWorking,
  solveDirectionalLaminate,
  thicknessBudget,
  thicknessBudgetWorking,
  type DirectionalLayer,
  type Support,
  type Working,
} from "#app/engine/index.ts";

const film = { thickness: 5e-6, youngsModulus: 117e9, poissonsRatio: 0.34, stress: { x: 2e8, y: 1e8 } };
const lines = { kind: "lines" as const, coverage: 0.4, lineWidth: 2e-5, direction: 0.5 };
const islands = { kind: "islands" as const, coverage: 0.4, size: 2e-5 };
const layers: DirectionalLayer[] = [
  { thickness: 2e-4, silicon: { direction: "110", angle: 0.1 } },
  { ...film, pattern: lines },
  { ...film, pattern: islands },
  { ...film, coverage: 0.3 },
];
const stoney = { force: { x: 200, y: 50 }, substrateThickness: 2e-4, youngsModulus: 169e9, poissonsRatio: 0.0625 };
const wafer = { radius: 0.15, thickness: 3e-4, youngsModulus: 151.3e9, poissonsRatio: 0.1605, density: 2329 };
const supports: Support[] = [
  { kind: "edge-ring" },
  { kind: "ring", radius: 0.1 },
  { kind: "points", count: 3, radius: 0.147 },
  { kind: "centre-point" },
  { kind: "centre-cup", radius: 0.02 },
  { kind: "rails", halfSpacing: 0.13 },
];
const chuck = {
  radius: 0.15,
  thickness: 775e-6,
  biaxialModulus: 180e9,
  poissonsRatio: 0.16,
  curvature: 0.04,
  vacuum: 8e4,
};
const dome = { ...chuck, curvature: -0.04 };
const bend = { thickness: 5e-5, direction: "110" as const };
const sphere = { thickness: 5e-5, radiusOfCurvature: 1, direction: "biaxial" as const };
const weibull = { characteristicStrength: 5e8, weibullModulus: 6, area: 0.07, referenceArea: 1e-5 };
const budget = {
  contributions: [
    { name: "carrier", variation: 1e-6 },
    { name: "grinding", variation: 8e-7 },
  ],
  finalThickness: 5e-5,
};
const cover = { bumpHeight: 3e-5, adhesiveThickness: 5e-5 };
const die = { layers: layers.slice(0, 2).map((layer) => ({ ...layer, cte: 3e-6 })), length: 0.01, width: 0.008 };

const cases: [string, Working | null, number | undefined][] = [
  ["κ_x", directionalLaminateWorking(layers, "curvatureX"), solveDirectionalLaminate(layers).curvatureX],
  ["twist", directionalLaminateWorking(layers, "twist"), solveDirectionalLaminate(layers).twist],
  [
    "force of lines",
    patternedFilmWorking({ ...film, pattern: lines }, "y"),
    patternedFilm({ ...film, pattern: lines }).force.y,
  ],
  [
    "force of a full film",
    patternedFilmWorking({ ...film, stress: 1e8, pattern: { kind: "full" } }, "x"),
    patternedFilm({ ...film, stress: 1e8, pattern: { kind: "full" } }).force.x,
  ],
  [
    "edge relief",
    edgeReliefWorking({ ...film, pattern: islands }),
    patternedFilm({ ...film, pattern: islands }).edgeRelief,
  ],
  ["κ_y of a thin film", directionalStoneyWorking(stoney, "y"), directionalStoneyCurvature(stoney).y],
  ...supports.map((support): [string, Working, number] => [
    `sag on ${support.kind}`,
    gravitySagWorking({ ...wafer, support }),
    gravitySag({ ...wafer, support }).peakToValley,
  ]),
  [
    "large sag",
    largeSagWorking({ ...wafer, support: { kind: "edge-ring" } }),
    gravitySag({ ...wafer, support: { kind: "edge-ring" } }).largeDeflection?.low,
  ],
  [
    "band of the sag",
    largeSagWorking({ ...wafer, support: { kind: "rails", halfSpacing: 0.13 } }),
    gravitySag({ ...wafer, support: { kind: "rails", halfSpacing: 0.13 } }).largeDeflection?.low,
  ],
  ["pressure, bowl", chuckPressureWorking(chuck), chuckFlattening(chuck).pressureNeeded],
  ["pressure, dome", chuckPressureWorking(dome), chuckFlattening(dome).pressureNeeded],
  ["stress at the faces", chuckSurfaceStressWorking(chuck), chuckFlattening(chuck).surfaceStress],
  ["lift", chuckRimLiftWorking(dome), chuckFlattening(dome).rimLift],
  ["flat stress", flatChuckStressWorking(layers, 1), flatChuckStress(layers).stress[1]?.x],
  ["bending", bendingStressWorking(sphere), bendingStress(sphere)],
  ["bend radius", minimumBendRadiusWorking({ ...bend, stress: 1.5e8 }), minimumBendRadius({ ...bend, stress: 1.5e8 })],
  ["failure", failureProbabilityWorking({ ...weibull, stress: 1e8 }), failureProbability({ ...weibull, stress: 1e8 })],
  ["strength by size", scaledStrengthWorking(weibull), scaledStrength(weibull)],
  ["budget, linear", thicknessBudgetWorking(budget, "linear"), thicknessBudget(budget).linear],
  ["budget", thicknessBudgetWorking(budget, "root sum square"), thicknessBudget(budget).rootSumSquare],
  ["bump cover", bumpCoverWorking(cover), bumpCover(cover).ratio],
  ["die", dieWarpWorking(die, 400), dieAfterDicing({ ...die, temperatures: [400] }).worst.warp],
];

function withAllBelow(working: Working): Working[] {
  return [working, ...(working.from ?? []).flatMap(withAllBelow)];
}

describe("workings", () => {
  it.each(cases)("%s carries the calculation's own figure and names known equations", (_, working, figure) => {
    if (!working) throw new Error("no working");
    expect(figure).toBeDefined();
    expect(working.result.value).toBe(figure);
    for (const { equation, inputs, result } of withAllBelow(working)) {
      expect(EQUATIONS).toHaveProperty(equation);
      for (const line of [...inputs, result]) {
        expect(Number.isFinite(line.value)).toBe(true);
        expect(line.meaning).not.toBe("");
      }
      const symbols = inputs.map(({ symbol }) => symbol);
      expect(new Set(symbols).size).toBe(symbols.length);
    }
  });

  it("have nothing to say of edges where there are none, nor of large sags where none is known", () => {
    expect(edgeReliefWorking({ ...film, pattern: { kind: "full" } })).toBeNull();
    expect(largeSagWorking({ ...wafer, thickness: 5e-5, support: { kind: "centre-point" } })).toBeNull();
  });
});
