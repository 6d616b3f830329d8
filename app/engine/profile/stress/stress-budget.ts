import { requireCurvature, requireWithin } from "../../inputs.ts";
import { stoneyStress, type StoneyFilm } from "../../stoney/stoney.ts";
import { combineUncertainty } from "../../uncertainty/combine.ts";
import { studentFactor } from "../../uncertainty/student.ts";

/** A standard uncertainty and the degrees of freedom behind it; left out, they are endless (a stated interval). */
export interface StatedUncertainty {
  standardUncertainty: number;
  degreesOfFreedom?: number;
}

/** What is known of the tool that measured the curvatures. */
export interface ToolUncertainty {
  /** of one scan's curvature when the wafer is taken off and put back, 1/m */
  repeatability?: StatedUncertainty;
  /** of the curvature of the tool's own reference (flat, rail, stage), 1/m; the same in every scan of one tool */
  offset?: StatedUncertainty;
  /** of its heights, as a share of them */
  heightCalibration?: StatedUncertainty;
  /** of its positions, as a share of them */
  positionCalibration?: StatedUncertainty;
}

export interface StressBudgetInput extends StoneyFilm {
  /** curvature of each scan, 1/m, film side up */
  before: number;
  after: number;
  /** of the change of curvature by the scatter of the scans, 1/m (`expandedUncertainty`/2 of the difference's fit, or with its degrees) */
  fit: StatedUncertainty;
  tool?: ToolUncertainty;
  /** scans before and after come from one tool without a new calibration between; default true */
  sameTool?: boolean;
  uncertainties: {
    /** m */
    substrateThickness: StatedUncertainty;
    /** Pa */
    biaxialModulus: StatedUncertainty;
    /** m */
    filmThickness: StatedUncertainty;
  };
}

export interface StressBudgetLine {
  input: string;
  /** of the input, in its unit */
  standardUncertainty: number;
  /** slope of the stress with it */
  sensitivity: number;
  /** Pa */
  contribution: number;
  degreesOfFreedom: number;
  /** how the scans before and after share it */
  shared: "each scan its own" | "common, cancels" | "common, kept" | "not of a scan";
  note: string;
}

export interface StressBudget {
  /** Pa */
  stress: number;
  standardUncertainty: number;
  /** by Welch and Satterthwaite */
  degreesOfFreedom: number;
  /** 2 for many degrees of freedom, more for few */
  coverageFactor: number;
  /** interval that holds the stress in 95 of 100 cases, Pa */
  expandedUncertainty: number;
  /** largest contribution first; lines that cancel last */
  lines: StressBudgetLine[];
}

const ENDLESS = 1e9;

/**
 * Uncertainty of a film stress from two scans by the law of propagation, with what the scans share treated as it is:
 *
 * - repeatability and scatter are each scan's own: root two of one scan's. The scatter of the fit is part of what repeats show, so the
 *   larger of the two counts, not both;
 * - the curvature of the tool's reference is the same in both scans of one tool and cancels; with two tools it does not;
 * - calibrations of height and position are common: they scale the change itself, positions twice. With two tools each scan's curvature
 *   is scaled by its own;
 * - thickness of the wafer (squared), its modulus and the film's thickness stand in front of the change: common, kept once.
 *
 * Expanded with Student's factor for the effective degrees of freedom, 2.00 when they are many.
 * Source: JCGM 100:2008, 5.1.2, 5.2.2 and annex G.4.
 * @throws EngineInputError for inputs out of range
 */
export function stressBudget(i: StressBudgetInput): StressBudget {
  const [before, after] = [requireCurvature("before", i.before), requireCurvature("after", i.after)];
  const stress = stoneyStress({ ...i, curvatureChange: after - before });
  const perCurvature = stoneyStress({ ...i, curvatureChange: 1 });
  const lines = [
    scatterLine(i, perCurvature),
    ...toolLines(i, stress, perCurvature),
    inputLine("substrate thickness", i.uncertainties.substrateThickness, (2 * stress) / i.substrateThickness, SQUARED),
    inputLine("biaxial modulus", i.uncertainties.biaxialModulus, stress / i.biaxialModulus, ONCE),
    inputLine("film thickness", i.uncertainties.filmThickness, -stress / i.filmThickness, ONCE),
  ];
  const { standardUncertainty } = combineUncertainty(
    lines.map(({ input, contribution }) => ({ input, sensitivity: 1, standardUncertainty: contribution })),
  );
  const degreesOfFreedom = effectiveDegrees(lines, standardUncertainty);
  const coverageFactor = studentFactor(degreesOfFreedom);
  return {
    stress,
    standardUncertainty,
    degreesOfFreedom,
    coverageFactor,
    expandedUncertainty: coverageFactor * standardUncertainty,
    lines: lines.toSorted((a, b) => b.contribution - a.contribution),
  };
}

const SQUARED = "Enters squared; the same wafer before and after, so it counts once for the change.";
const ONCE = "Stands in front of the change of curvature: it counts once.";

function checked(input: string, { standardUncertainty, degreesOfFreedom = ENDLESS }: StatedUncertainty) {
  return {
    standardUncertainty: requireWithin(`${input}.standardUncertainty`, standardUncertainty, 0, Number.MAX_VALUE, "1"),
    degreesOfFreedom: requireWithin(`${input}.degreesOfFreedom`, degreesOfFreedom, 1, ENDLESS, "1"),
  };
}

function inputLine(input: string, stated: StatedUncertainty, sensitivity: number, note: string): StressBudgetLine {
  const { standardUncertainty, degreesOfFreedom } = checked(input, stated);
  const contribution = Math.abs(sensitivity) * standardUncertainty;
  return { input, standardUncertainty, sensitivity, contribution, degreesOfFreedom, shared: "not of a scan", note };
}

function scatterLine({ fit, tool }: StressBudgetInput, perCurvature: number): StressBudgetLine {
  const scatter = checked("fit", fit);
  const repeats = tool?.repeatability ? checked("tool.repeatability", tool.repeatability) : null;
  const twice = repeats && { ...repeats, standardUncertainty: Math.SQRT2 * repeats.standardUncertainty };
  const larger = twice && twice.standardUncertainty >= scatter.standardUncertainty ? twice : scatter;
  const own = larger === scatter;
  return {
    input: own ? "scatter of the scans" : "repeatability of the tool",
    ...larger,
    sensitivity: perCurvature,
    contribution: Math.abs(perCurvature) * larger.standardUncertainty,
    shared: "each scan its own",
    note: own
      ? repeats
        ? "Larger than what the repeats show, which holds it already."
        : "From the fit alone: no repeats of the tool are given."
      : "Root two of one scan's, as both scans have it; the scatter of the fit is part of it.",
  };
}

function toolLines(i: StressBudgetInput, stress: number, perCurvature: number): StressBudgetLine[] {
  const { tool = {}, sameTool = true, before, after } = i;
  const lines: StressBudgetLine[] = [];
  if (tool.offset) {
    const offset = checked("tool.offset", tool.offset);
    lines.push({
      input: "curvature of the tool's reference",
      ...offset,
      sensitivity: sameTool ? 0 : Math.SQRT2 * perCurvature,
      contribution: sameTool ? 0 : Math.SQRT2 * Math.abs(perCurvature) * offset.standardUncertainty,
      shared: sameTool ? "common, cancels" : "each scan its own",
      note: sameTool
        ? `The same in both scans; alone it would give ${Math.round((Math.abs(perCurvature) * offset.standardUncertainty) / 1e5) / 10}\u00A0MPa.`
        : "Two tools, or one calibrated anew between: it does not cancel.",
    });
  }
  const calibrations = [
    ["height calibration", tool.heightCalibration, 1],
    ["position calibration", tool.positionCalibration, -2],
  ] as const;
  for (const [input, stated, power] of calibrations) {
    if (!stated) continue;
    const calibration = checked(input, stated);
    // Two tools scale each scan's curvature by an error of its own.
    const sensitivity = power * (sameTool ? stress : Math.hypot(before, after) * perCurvature);
    lines.push({
      input,
      ...calibration,
      sensitivity,
      contribution: Math.abs(sensitivity) * calibration.standardUncertainty,
      shared: sameTool ? "common, kept" : "each scan its own",
      note: sameTool ? "Scales both scans alike, so it scales the change." : "Scales each scan by its own error.",
    });
  }
  return lines;
}

/** Welch and Satterthwaite: u⁴ over the sum of each contribution's u⁴ over its degrees of freedom. */
function effectiveDegrees(lines: readonly StressBudgetLine[], total: number): number {
  if (total === 0) return ENDLESS;
  const sum = lines.reduce(
    (rest, { contribution, degreesOfFreedom }) => rest + (contribution / total) ** 4 / degreesOfFreedom,
    0,
  );
  return Math.min(ENDLESS, 1 / sum);
}
