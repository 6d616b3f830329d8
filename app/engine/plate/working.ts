import type { Working, WorkingLine } from "../working.ts";
import { criticalFilmForce, criticalLinearCurvature } from "./critical-load.ts";
import { freeWaferShape, type FreeWaferShapeInput, type PlateInput } from "./free-wafer-shape.ts";

function plateLines(i: PlateInput): WorkingLine[] {
  return [
    { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
    { symbol: "h", meaning: "thickness, or effective thickness of the stack", value: i.thickness, unit: "m" },
    { symbol: "ν", meaning: "Poisson's ratio of the plate", value: i.poissonsRatio, unit: "1" },
  ];
}

const ANISOTROPY = "Silicon (100): onset and stretching by the crystal's constants, rolling about its soft axes.";

/** The bow of `freeWaferShape` along its major axis as data; the result has the sign of the curvature. */
export function freeWaferShapeWorking(i: FreeWaferShapeInput): Working {
  const shape = freeWaferShape(i);
  const { x, y } =
    typeof i.linearCurvature === "number" ? { x: i.linearCurvature, y: i.linearCurvature } : i.linearCurvature;
  const rolled = shape.regime === "curled";
  const curvatures: WorkingLine[] =
    x === y
      ? [{ symbol: "κ_lin", meaning: "curvature by small-deflection theory", value: x, unit: "1/m" }]
      : [
          { symbol: "κ_x", meaning: "curvature along x by small-deflection theory", value: x, unit: "1/m" },
          { symbol: "κ_y", meaning: "curvature along y by small-deflection theory", value: y, unit: "1/m" },
        ];
  return {
    equation: rolled ? "free-wafer-curled" : "free-wafer-bowl",
    inputs: [
      ...curvatures,
      ...plateLines(i),
      { symbol: "S/S_cr", meaning: "load over critical load", value: shape.stabilityRatio, unit: "1" },
    ],
    result: {
      symbol: "s",
      meaning: "rim over centre along the axis that bends most",
      value: shape.bowMajor,
      unit: "m",
    },
    note: i.crystal === "100" ? ANISOTROPY : undefined,
    from: [criticalCurvatureWorking(i)],
  };
}

function criticalCurvatureWorking(i: PlateInput): Working {
  return {
    equation: "critical-curvature",
    inputs: plateLines(i),
    result: {
      symbol: "κ_cr",
      meaning: "small-deflection curvature at which the wafer starts to roll",
      value: criticalLinearCurvature(i),
      unit: "1/m",
    },
    note: i.crystal === "100" ? ANISOTROPY : undefined,
  };
}

/** The calculation of `criticalFilmForce` as data. */
export function criticalFilmForceWorking(i: PlateInput): Working {
  const biaxialModulus = i.youngsModulus / (1 - i.poissonsRatio);
  return {
    equation: "critical-film-force",
    inputs: [
      ...plateLines(i),
      { symbol: "M", meaning: "biaxial modulus of the wafer", value: biaxialModulus, unit: "Pa" },
    ],
    result: {
      symbol: "N_cr",
      meaning: "film force at which it starts to roll",
      value: criticalFilmForce(i),
      unit: "N/m",
    },
    from: [criticalCurvatureWorking(i)],
  };
}
