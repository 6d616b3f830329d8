import type { Working, WorkingLine } from "../working.ts";
import { criticalFilmForce, criticalLinearCurvature } from "./critical-load.ts";
import { freeWaferShape, plateShapeOf, type FreeWaferShapeInput, type PlateInput } from "./free-wafer-shape.ts";

function plateLines(i: PlateInput): WorkingLine[] {
  return [
    { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
    { symbol: "h", meaning: "thickness, or effective thickness of the stack", value: i.thickness, unit: "m" },
    { symbol: "ν", meaning: "Poisson's ratio of the plate", value: i.poissonsRatio, unit: "1" },
  ];
}

const ANISOTROPY = "Silicon (100): bending and stretching by the crystal's constants; equal loads roll it about <100>.";
const IN_FULL =
  "The figure is the plate solved in full; the formula is exact for small bows and within 0.3 % up to the onset.";
const CRYSTAL_IN_FULL =
  "Silicon (100): the figure is the plate solved in full with the crystal's constants; the formula with ν = 0.28 is within 0.7 % up to the onset.";

/** The bow of `freeWaferShape` along its major axis as data; the result has the sign of the curvature. */
export function freeWaferShapeWorking(i: FreeWaferShapeInput): Working {
  const shape = freeWaferShape(i);
  const { x, y } =
    typeof i.linearCurvature === "number" ? { x: i.linearCurvature, y: i.linearCurvature } : i.linearCurvature;
  const bowl = shape.regime !== "curled" && x === y;
  const curvatures: WorkingLine[] =
    x === y
      ? [{ symbol: "κ_lin", meaning: "curvature by small-deflection theory", value: x, unit: "1/m" }]
      : [
          { symbol: "κ_x", meaning: "curvature along x by small-deflection theory", value: x, unit: "1/m" },
          { symbol: "κ_y", meaning: "curvature along y by small-deflection theory", value: y, unit: "1/m" },
        ];
  return {
    equation: bowl ? "free-wafer-bowl" : "free-wafer-curled",
    inputs: [
      ...curvatures,
      ...plateLines(i),
      { symbol: "S/S_cr", meaning: "load over critical load", value: shape.stabilityRatio, unit: "1" },
      ...(bowl ? [] : stateLines(i)),
    ],
    result: {
      symbol: "s",
      meaning: "rim over centre along the axis that bends most",
      value: shape.bowMajor,
      unit: "m",
    },
    note: shapeNote(bowl, i.crystal === "100"),
    from: [criticalCurvatureWorking(i)],
  };
}

function shapeNote(bowl: boolean, crystal: boolean): string | undefined {
  if (bowl) return crystal ? CRYSTAL_IN_FULL : IN_FULL;
  return crystal ? ANISOTROPY : undefined;
}

/** The state behind a shape: what the table was asked for and gave. */
function stateLines(i: FreeWaferShapeInput): WorkingLine[] {
  const { average, softening, bow } = plateShapeOf(i);
  const major = Math.abs(bow.mean) + Math.abs(bow.halfDifference);
  return [
    {
      symbol: "A",
      meaning: "mean of the curvatures averaged over the area, times R^2/(4h)",
      value: average.mean,
      unit: "1",
    },
    { symbol: "B", meaning: "half their difference, times R^2/(4h)", value: average.halfDifference, unit: "1" },
    {
      symbol: "m",
      meaning: "share left of uniform curvature's resistance",
      value: softening,
      unit: "1",
      source: "plate-von-karman",
    },
    {
      symbol: "K",
      meaning: "bow over twice the thickness, its size",
      value: major,
      unit: "1",
      source: "plate-von-karman",
    },
  ];
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
