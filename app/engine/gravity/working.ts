import type { EquationId } from "../equations.ts";
import type { Working, WorkingLine } from "../working.ts";
import { checkWafer, gravitySag, STANDARD_GRAVITY, type GravitySagInput } from "./gravity-sag.ts";
import type { Support } from "./support.ts";

/** The peak to valley of `gravitySag` by small deflections as data. */
export function gravitySagWorking(i: GravitySagInput): Working {
  const sag = gravitySag(i);
  const { stiffness, weight } = checkWafer(i);
  return {
    equation: equationOf(i.support),
    inputs: [
      { symbol: "q", meaning: "weight per area", value: weight, unit: "Pa" },
      { symbol: "ρ", meaning: "density", value: i.density, unit: "kg/m3" },
      { symbol: "g", meaning: "acceleration of free fall", value: i.gravity ?? STANDARD_GRAVITY, unit: "m/s2" },
      { symbol: "R", meaning: "wafer radius", value: i.radius, unit: "m" },
      ...supportLines(i.support, i.radius),
      { symbol: "ν", meaning: "Poisson's ratio of the plate", value: i.poissonsRatio, unit: "1" },
    ],
    result: { symbol: "w", meaning: "highest less lowest place of the wafer", value: sag.peakToValley, unit: "m" },
    note: sag.linearValid
      ? "Deflections are small: within 5 %."
      : "Deflections are not small here: the figure is an upper bound.",
    from: [plateStiffnessWorking(i, stiffness)],
  };
}

/** The lower bound of the peak to valley by large deflections as data; null where `gravitySag` knows none. */
export function largeSagWorking(i: GravitySagInput): Working | null {
  const sag = gravitySag(i);
  if (sag.largeDeflection === null) return null;
  const { low, high } = sag.largeDeflection;
  return {
    equation: "sag-large",
    inputs: [
      { symbol: "w", meaning: "highest less lowest place by small deflections", value: sag.peakToValley, unit: "m" },
      { symbol: "Q", meaning: "load", value: sag.load, unit: "1" },
      { symbol: "h", meaning: "thickness", value: i.thickness, unit: "m" },
      { symbol: "r", meaning: "ratio", value: sag.peakToValley === 0 ? 1 : low / sag.peakToValley, unit: "1" },
    ],
    result: { symbol: "w_large", meaning: "highest less lowest place", value: low, unit: "m" },
    note: low === high ? undefined : "Lower bound of a range that reaches up to the sag by small deflections.",
    from: [gravitySagWorking(i)],
  };
}

function plateStiffnessWorking(i: GravitySagInput, stiffness: number): Working {
  return {
    equation: "plate-stiffness",
    inputs: [
      { symbol: "E", meaning: "Young's modulus of the plate", value: i.youngsModulus, unit: "Pa" },
      { symbol: "h", meaning: "thickness", value: i.thickness, unit: "m" },
      { symbol: "ν", meaning: "Poisson's ratio of the plate", value: i.poissonsRatio, unit: "1" },
    ],
    result: { symbol: "D", meaning: "bending stiffness", value: stiffness, unit: "N·m" },
  };
}

function equationOf(support: Support): EquationId {
  return `sag-${support.kind}`;
}

function supportLines(support: Support, radius: number): WorkingLine[] {
  const share = (symbol: string, meaning: string, length: number): WorkingLine => ({
    symbol,
    meaning,
    value: length / radius,
    unit: "1",
  });
  switch (support.kind) {
    case "edge-ring":
    case "centre-point":
      return [];
    case "ring":
      return [share("b", "radius of the ring over that of the wafer", support.radius)];
    case "centre-cup":
      return [share("c", "radius of the cup over that of the wafer", support.radius)];
    case "points":
      return [
        { symbol: "n", meaning: "number of points", value: support.count, unit: "1" },
        share("b", "radius of the circle of points over that of the wafer", support.radius),
      ];
    case "rails":
      return [share("c", "half the spacing of the rails over the radius of the wafer", support.halfSpacing)];
  }
}
