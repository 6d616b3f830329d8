import type { Finding } from "#app/engine/rules/finding.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { outcomeRank, supportRank, type Holding } from "#app/engine/vocabulary.ts";
import type { BondResult, StepResult } from "#app/schemas/assessment-result.ts";
import { celsius } from "./assessment-figure.ts";
import { isRolled } from "./lying-as.ts";
import type { SheetGroup } from "./sheet-groups.ts";
import { roundedRadius } from "./sheet-round.ts";
import { stepsInWords } from "./step-numbers.ts";

/** More than these are not read at the tool. */
const MOST_LINES = 5;

/** What a group's lines follow from, beside its steps. */
export interface DoNotContext {
  /** all steps of the flow */
  flow: readonly StepResult[];
  findings: readonly Finding[];
  bonds: readonly BondResult[];
  /** highest temperature on tape, K */
  tapeTemperature: number;
}

/** At most five things not to do while this holds the wafer: what the assessment stops first, then what the state forbids. */
export function doNotLines(group: SheetGroup, context: DoNotContext): string[] {
  const lines = [
    ...blockedLines(group, context),
    ...liftLines(group),
    ...touchLines(group),
    ...releaseLines(group, context.flow),
    ...heatLines(group, context),
    ...vacuumLines(group, context),
    ...trimLines(group, context.flow),
  ];
  return lines.slice(0, MOST_LINES);
}

/** Why a step must not run, in words for hands. */
const BLOCKED: Record<number, string> = {
  1: "it needs more support",
  2: "it bows more than the tool takes",
  3: "it would roll up",
  4: "the chuck does not hold it flat",
  5: "it does not fit the slot or robot",
  6: "the bond does not stand it",
  7: "the carrier does not stand it",
  8: "it would come off its carrier free",
  9: "its thickness varies too much, or its bumps stand out",
  10: "its edge or ground face would break it",
  11: "it is too hot for its films or solder",
  12: "it cannot be done in this order",
  15: "the lot is not as assessed",
  16: "the tape does not stand it",
  17: "it would be too late, or wet",
  18: "it would be touched on its bumps",
};

function whyBlocked(step: StepResult, { rule, outcome, limit }: Finding, tapeTemperature: number): string {
  if (outcome === "cannot judge") return "an input is missing";
  if (rule === 6 && step.peakTemperature > ROOM_TEMPERATURE && limit?.temperaturePoint)
    return "it is too hot for the bond";
  if ((rule === 8 || rule === 12 || rule === 16) && onTape(step.planned)) {
    if (step.peakTemperature > tapeTemperature) return "it is too hot for the tape";
    if (step.exposures.includes("vacuum") || step.exposures.includes("plasma")) return "tape takes no vacuum";
  }
  return BLOCKED[rule] ?? "the assessment stops it";
}

/** Each step that is stopped, once, for the first of its reasons; steps that the same thing stops stand together. */
function blockedLines({ steps }: SheetGroup, { findings, tapeTemperature }: DoNotContext): string[] {
  const found = new Map<string, number[]>();
  for (const step of steps) {
    const blocking = findings.filter(
      ({ step: number, outcome }) => number === step.number && outcomeRank(outcome) >= outcomeRank("needs support"),
    );
    const [first] = blocking.sort((a, b) => a.rule - b.rule);
    if (!first) continue;
    const why = whyBlocked(step, first, tapeTemperature);
    found.set(why, [...(found.get(why) ?? []), step.number]);
  }
  return [...found].map(([why, numbers]) => `Do not run ${stepsInWords(numbers)}: ${why}`);
}

/** Tape, frame and carrier cover the device side or keep hands away from it. */
function touchLines({ holding }: SheetGroup): string[] {
  return holding === "bare" || holding === "thin-wafer gripper" ? ["Do not touch the device side"] : [];
}

function liftLines({ steps }: SheetGroup): string[] {
  const thin = steps.some(({ required }) => supportRank(required) > supportRank("bare"));
  return thin ? ["Do not lift bare"] : [];
}

/** A diced wafer is dies on tape: it has no shape of its own any more. */
function releaseLines({ holding, steps }: SheetGroup, flow: readonly StepResult[]): string[] {
  if (holding === "bare") return [];
  const diced = flow.find(({ kind }) => kind === "dice")?.number ?? Infinity;
  const radii = steps.flatMap(({ number, released }) =>
    number < diced && isRolled(released) ? [released.rollRadius] : [],
  );
  return radii.length === 0 ? [] : [`Do not release: rolls to about ${roundedRadius(Math.min(...radii))}`];
}

const onTape = (holding: Holding) => holding === "grinding tape" || holding === "film frame";

const bondsOf = ({ steps }: SheetGroup, bonds: readonly BondResult[]) =>
  bonds.filter((bond) => steps.some(({ number }) => bond.fromStep <= number && number <= bond.toStep));

function heatLines(group: SheetGroup, { bonds, tapeTemperature }: DoNotContext): string[] {
  if (onTape(group.holding)) return [`Do not heat above ${celsius(tapeTemperature)} on tape`];
  const limits = bondsOf(group, bonds).map(({ temperatureLimit }) => temperatureLimit);
  // Between two carriers the bond that takes less decides.
  return limits.length === 0 ? [] : [`Do not heat above ${celsius(Math.min(...limits))}: the bond`];
}

function vacuumLines(group: SheetGroup, { bonds }: DoNotContext): string[] {
  if (onTape(group.holding)) return ["Do not put into vacuum on tape"];
  const flows = bondsOf(group, bonds).flatMap(({ flowsFrom }) => flowsFrom ?? []);
  return flows.length === 0 ? [] : [`Do not put into vacuum above ${celsius(Math.min(...flows))}: the bond flows`];
}

function trimLines({ steps }: SheetGroup, flow: readonly StepResult[]): string[] {
  const ground = flow.find(({ kind }) => kind === "grind")?.number ?? Infinity;
  const diced = flow.find(({ kind }) => kind === "dice")?.number ?? Infinity;
  const trims = steps.some(({ number }) => number >= ground && number < diced);
  return trims ? ["Do not trim after grinding"] : [];
}
