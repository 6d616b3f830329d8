import type { Working, WorkingLine } from "../working.ts";
import { bendingModulus, bendingStress, minimumBendRadius, type BendDirection } from "./bending.ts";
import { failureProbability, scaledStrength, type WeibullStrength } from "./weibull.ts";

function bentWafer(i: { thickness: number; direction: BendDirection }): WorkingLine[] {
  const bend = i.direction === "biaxial" ? "a sphere" : `a roll along <${i.direction}>`;
  return [
    { symbol: "E_b", meaning: `stress per strain of ${bend}`, value: bendingModulus(i.direction), unit: "Pa" },
    { symbol: "h", meaning: "wafer thickness", value: i.thickness, unit: "m" },
  ];
}

/** The calculation of `bendingStress` as data. */
export function bendingStressWorking(i: Parameters<typeof bendingStress>[0]): Working {
  return {
    equation: "bending-stress",
    inputs: [...bentWafer(i), { symbol: "ρ", meaning: "radius of curvature", value: i.radiusOfCurvature, unit: "m" }],
    result: { symbol: "σ", meaning: "tension at the outer face", value: bendingStress(i), unit: "Pa" },
  };
}

/** The calculation of `minimumBendRadius` as data. */
export function minimumBendRadiusWorking(i: Parameters<typeof minimumBendRadius>[0]): Working {
  return {
    equation: "minimum-bend-radius",
    inputs: [...bentWafer(i), { symbol: "σ", meaning: "stress allowed", value: i.stress, unit: "Pa" }],
    result: { symbol: "ρ_min", meaning: "smallest radius of curvature", value: minimumBendRadius(i), unit: "m" },
  };
}

function strengthLines(i: WeibullStrength): WorkingLine[] {
  const lines: WorkingLine[] = [
    { symbol: "σ_0", meaning: "characteristic strength", value: i.characteristicStrength, unit: "Pa" },
    { symbol: "m", meaning: "Weibull modulus", value: i.weibullModulus, unit: "1" },
  ];
  if (i.area !== undefined && i.referenceArea !== undefined) {
    lines.push(
      { symbol: "A", meaning: "area under tension", value: i.area, unit: "m2" },
      { symbol: "A_0", meaning: "area of the pieces tested", value: i.referenceArea, unit: "m2" },
    );
  }
  return lines;
}

/** The calculation of `failureProbability` as data. */
export function failureProbabilityWorking(i: Parameters<typeof failureProbability>[0]): Working {
  return {
    equation: "weibull",
    inputs: [{ symbol: "σ", meaning: "tension", value: i.stress, unit: "Pa" }, ...strengthLines(i)],
    result: { symbol: "P", meaning: "probability of failure", value: failureProbability(i), unit: "1" },
    note: "It ranks steps for engineers and belongs on no sheet.",
  };
}

/** The calculation of `scaledStrength` as data. */
export function scaledStrengthWorking(i: WeibullStrength): Working {
  return {
    equation: "weibull-size",
    inputs: strengthLines(i),
    result: { symbol: "σ_A", meaning: "characteristic strength of the part", value: scaledStrength(i), unit: "Pa" },
  };
}
