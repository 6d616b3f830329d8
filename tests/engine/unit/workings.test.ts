/* Workings: the calculation behind a figure as data. They must carry the figure of the calculation itself. */
import { describe, expect, it } from "vitest";
import { EQUATIONS } from "#app/engine/equations.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { laminateWorking } from "#app/engine/laminate/working.ts";
import { criticalFilmForce } from "#app/engine/plate/critical-load.ts";
import { freeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { criticalFilmForceWorking, freeWaferShapeWorking } from "#app/engine/plate/working.ts";
import { filmStressFromProfiles } from "#app/engine/profile/film-stress.ts";
import { filmStressFromProfilesWorking } from "#app/engine/profile/working.ts";
import { bowFromCurvature } from "#app/engine/stoney/bow.ts";
import { filmForce } from "#app/engine/stoney/film-force.ts";
import { stoneyCurvature, stoneyStress } from "#app/engine/stoney/stoney.ts";
import {
  bowFromCurvatureWorking,
  filmForceWorking,
  stoneyCurvatureWorking,
  stoneyStressWorking,
} from "#app/engine/stoney/working.ts";
import type { Working } from "#app/engine/working.ts";

const film = { filmThickness: 1e-6, substrateThickness: 725e-6, biaxialModulus: 180e9 };
const plate = { radius: 0.15, thickness: 100e-6, youngsModulus: 130e9, poissonsRatio: 0.2786 };
const layers: Layer[] = [
  { thickness: 725e-6, youngsModulus: 130e9, poissonsRatio: 0.2786, cte: "silicon" },
  { thickness: 5e-6, youngsModulus: 117e9, poissonsRatio: 0.34, stress: 200e6, cte: 16.7e-6, coverage: 0.35 },
];
const parabola = (half: number) =>
  Array.from({ length: 101 }, (_, n) => ({ x: -0.05 + n * 1e-3, z: half * (-0.05 + n * 1e-3) ** 2 }));
const scans = { ...film, pre: parabola(0), post: parabola(0.005), edgeExclusion: 0.003 };

const cases: [string, Working, number][] = [
  [
    "stoneyCurvature",
    stoneyCurvatureWorking({ ...film, filmStress: 1e8 }),
    stoneyCurvature({ ...film, filmStress: 1e8 }),
  ],
  [
    "stoneyStress",
    stoneyStressWorking({ ...film, curvatureChange: 0.01 }),
    stoneyStress({ ...film, curvatureChange: 0.01 }),
  ],
  [
    "bowFromCurvature",
    bowFromCurvatureWorking({ curvature: 0.01, radius: 0.15 }),
    bowFromCurvature({ curvature: 0.01, radius: 0.15 }),
  ],
  [
    "bowFromCurvature, arc",
    bowFromCurvatureWorking({ curvature: 3, radius: 0.15, exact: true }),
    bowFromCurvature({ curvature: 3, radius: 0.15, exact: true }),
  ],
  [
    "filmForce",
    filmForceWorking({ stress: 1e8, thickness: 1e-6, coverage: 0.5 }),
    filmForce({ stress: 1e8, thickness: 1e-6, coverage: 0.5 }),
  ],
  ["laminate", laminateWorking(layers, { temperature: 400 }), solveLaminate(layers, { temperature: 400 }).curvature],
  [
    "bowl",
    freeWaferShapeWorking({ ...plate, linearCurvature: 0.01 }),
    freeWaferShape({ ...plate, linearCurvature: 0.01 }).bowMajor,
  ],
  [
    "curled",
    freeWaferShapeWorking({ ...plate, crystal: "100", linearCurvature: { x: 1, y: 0.9 } }),
    freeWaferShape({ ...plate, crystal: "100", linearCurvature: { x: 1, y: 0.9 } }).bowMajor,
  ],
  ["criticalFilmForce", criticalFilmForceWorking(plate), criticalFilmForce(plate)],
  ["film stress from profiles", filmStressFromProfilesWorking(scans), filmStressFromProfiles(scans).stress],
];

describe("workings", () => {
  it.each(cases)("%s carries the calculation's own figure and names known equations", (_, working, figure) => {
    expect(working.result.value).toBe(figure);
    const all = [working, ...(working.from ?? [])];
    for (const { equation, inputs, result } of all) {
      expect(EQUATIONS).toHaveProperty(equation);
      for (const line of [...inputs, result]) {
        expect(Number.isFinite(line.value)).toBe(true);
        expect(line.meaning).not.toBe("");
      }
      const symbols = inputs.map(({ symbol }) => symbol);
      expect(new Set(symbols).size).toBe(symbols.length);
    }
  });

  it("a laminate lists its layers from the bottom, with coverage where it was given", () => {
    const { inputs } = laminateWorking(layers);
    expect(inputs.map(({ symbol }) => symbol)).toEqual(["T", "h_1", "M_1", "e_1", "h_2", "M_2", "e_2", "f_2"]);
    expect(inputs[0]).toMatchObject({ value: 298.15, temperaturePoint: true });
  });

  it("a curled wafer rests on its own equation and on the critical curvature", () => {
    const working = freeWaferShapeWorking({ ...plate, linearCurvature: 1 });
    expect(working.equation).toBe("free-wafer-curled");
    expect(working.from?.map(({ equation }) => equation)).toEqual(["critical-curvature"]);
    expect(freeWaferShapeWorking({ ...plate, linearCurvature: 0.01 }).equation).toBe("free-wafer-bowl");
  });
});
