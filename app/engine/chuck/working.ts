import type { DirectionalLayer } from "../directional/layer.ts";
import { EngineInputError } from "../errors.ts";
import type { Working, WorkingLine } from "../working.ts";
import { chuckFlattening, type ChuckFlatteningInput } from "./chuck-flattening.ts";
import { flatChuckStress } from "./flat-chuck-stress.ts";

function waferLines(i: ChuckFlatteningInput): WorkingLine[] {
  return [
    { symbol: "κ", meaning: "curvature as the wafer lies on the chuck", value: i.curvature, unit: "1/m" },
    { symbol: "h", meaning: "wafer thickness", value: i.thickness, unit: "m" },
    { symbol: "M", meaning: "biaxial modulus of the wafer", value: i.biaxialModulus, unit: "Pa" },
  ];
}

/** The pressure of `chuckFlattening` as data. */
export function chuckPressureWorking(i: ChuckFlatteningInput): Working {
  const { gap, pressureNeeded } = chuckFlattening(i);
  const bowl = i.curvature >= 0;
  return {
    equation: bowl ? "chuck-pressure-bowl" : "chuck-pressure-dome",
    inputs: [
      { symbol: "w", meaning: bowl ? "gap under the rim" : "gap under the centre", value: gap, unit: "m" },
      { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
      { symbol: "ν", meaning: "Poisson's ratio", value: i.poissonsRatio, unit: "1" },
      ...waferLines(i),
    ],
    result: { symbol: "p_1", meaning: "pressure difference", value: pressureNeeded, unit: "Pa" },
  };
}

/** The stress at the faces of `chuckFlattening` as data. */
export function chuckSurfaceStressWorking(i: ChuckFlatteningInput): Working {
  return {
    equation: "chuck-surface-stress",
    inputs: waferLines(i),
    result: {
      symbol: "σ",
      meaning: "change at the faces from free to flat",
      value: chuckFlattening(i).surfaceStress,
      unit: "Pa",
    },
    note: "Tension on the face that was concave, compression on the other.",
  };
}

/** The lift left at the rim by `chuckFlattening` as data. */
export function chuckRimLiftWorking(i: ChuckFlatteningInput): Working {
  const { rimLift, rimLength } = chuckFlattening(i);
  return {
    equation: "chuck-rim-lift",
    inputs: [
      { symbol: "p", meaning: "pressure difference", value: i.vacuum, unit: "Pa" },
      { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
      { symbol: "ν", meaning: "Poisson's ratio", value: i.poissonsRatio, unit: "1" },
      ...waferLines(i),
      { symbol: "L", meaning: "width of the ring that stands off", value: rimLength, unit: "m" },
    ],
    result: { symbol: "z", meaning: "height left over the chuck", value: rimLift, unit: "m" },
    note: "From the plate with one-sided contact, of which the formula is the narrow limit.",
  };
}

/** The stress of one layer, counted from 0 at the bottom, by `flatChuckStress` along x, as data. */
export function flatChuckStressWorking(
  layersBottomToTop: readonly DirectionalLayer[],
  layer: number,
  o: { temperature?: number } = {},
): Working {
  const { strain, stress } = flatChuckStress(layersBottomToTop, o);
  const of = stress[layer];
  if (!of) throw new EngineInputError("layer", "is not one of the stack", `0 to ${stress.length - 1}`);
  return {
    equation: "flat-chuck-stress",
    inputs: [
      { symbol: "i", meaning: "layer, counted from the bottom", value: layer + 1, unit: "1" },
      { symbol: "ε_x", meaning: "strain of the flat stack along x", value: strain.x, unit: "1" },
      { symbol: "ε_y", meaning: "strain of the flat stack along y", value: strain.y, unit: "1" },
    ],
    result: { symbol: "σ_i", meaning: "stress along x in the layer", value: of.x, unit: "Pa" },
  };
}
