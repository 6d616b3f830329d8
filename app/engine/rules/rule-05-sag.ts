import { carriedSag, type GravitySagInput } from "../gravity/gravity-sag.ts";
import { siliconSagConstants } from "../gravity/silicon-sag-constants.ts";
import type { CarryingSupport } from "../gravity/support.ts";
import type { Clamping } from "../flow/handling-inputs.ts";
import type { LyingShape } from "../flow/shape.ts";
import type { WaferState } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { SILICON_DENSITY } from "../silicon/density.ts";
import { formatNumber } from "../units/format-number.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import { isBonded, whatLies } from "./bonded.ts";
import type { Finding, FindingLimit, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit, statedLimit } from "./make-finding.ts";
import { arealMass, carrierDensity, USUAL_GLASS_DENSITY } from "./mass.ts";
import { thinnest } from "./rule-01-thickness.ts";
import { height, millimetres } from "./words.ts";

const TITLE = "Sag and clearance";
const make = findingsOf(5, TITLE);

const IN_SLOTS = ["receive", "store", "hold", "move"];

/** Where a holder carries a wafer, as a share of its radius (common practice, no source). */
const LEDGES_AT = 0.9;
const PINS_AT = 0.7;

/** What carries the wafer: ledges in a store, else as the tool clamps; null where it lies on a plate. */
function supportOf(clamping: Clamping | null, inSlots: boolean, radius: number): CarryingSupport | null {
  switch (clamping) {
    case "ledges":
    case "boat":
      return { kind: "rails", halfSpacing: LEDGES_AT * radius };
    case "edge grip":
      return { kind: "points", count: 3, radius };
    case "pins":
      return { kind: "points", count: 3, radius: PINS_AT * radius };
    default:
      return inSlots ? { kind: "rails", halfSpacing: LEDGES_AT * radius } : null;
  }
}

const WORDS: Record<CarryingSupport["kind"], string> = { rails: "on two ledges", points: "on three points" };

/** Clearance that sag and warp may take, with the margin below it that is a caution; null where none is known. */
function clearanceOf({ flow, limits }: RuleContext, state: StepState, inSlots: boolean) {
  const tool = state.step.equipment;
  if (tool?.slotClearance)
    return {
      limit: statedLimit(`${tool.name}, clearance`, tool.slotClearance, "m"),
      margin: tool.slotClearance.value * limits.warpMargin.value,
    };
  if (!inSlots || exceeds(flow.wafer.diameter, 0.3)) return null;
  return exceeds(flow.wafer.diameter, 0.2)
    ? { limit: siteLimit(limits, "slot300"), margin: limits.slot300.value - limits.slotClear300.value }
    : { limit: siteLimit(limits, "slot200"), margin: limits.slot200.value - limits.slotClear200.value };
}

type CarriedPlate = GravitySagInput & { support: CarryingSupport };

/** The plate that sags: silicon at its thinnest, or a pair by its effective thickness and its own weight. */
function plateOf({ flow }: RuleContext, state: StepState, shape: LyingShape, support: CarryingSupport): CarriedPlate {
  const { diameter, orientation } = flow.wafer;
  const { youngsModulus, poissonsRatio } = siliconSagConstants(orientation, support);
  const paired = isBonded(state.after);
  const thickness = paired ? shape.disc.thickness : Math.max(thinnest(state), 1e-9);
  const density = paired ? arealMass(state.after, USUAL_GLASS_DENSITY) / thickness : SILICON_DENSITY;
  return { radius: diameter / 2, thickness, youngsModulus, poissonsRatio, density, support };
}

function sagging(context: RuleContext, state: StepState, shape: LyingShape): Finding[] {
  const inSlots = IN_SLOTS.includes(state.step.kind);
  const clearance = clearanceOf(context, state, inSlots);
  const support = supportOf(state.step.equipment?.clamping ?? null, inSlots, context.flow.wafer.diameter / 2);
  if (!clearance || !support) return [];
  const plate = plateOf(context, state, shape, support);
  const sag = carriedSag(plate);
  const least = sag.largeDeflection?.low ?? sag.peakToValley;
  const most = sag.peakToValley;
  const paired = isBonded(state.after);
  const { value } = clearance.limit;
  const fail = paired ? "do not run" : "needs support";
  // Between the two bounds of large deflections it may or may not fit.
  const outcome = exceeds(least + shape.warp, value)
    ? fail
    : againstUpperLimit(most + shape.warp, value, clearance.margin, "caution");
  const range = exceeds(most, least * 1.05) ? `${height(least)} to ${height(most)}` : height(most);
  return [
    make(
      state,
      outcome,
      `${whatLies(state.after)} sags ${range} ${WORDS[support.kind]} and warps ${height(shape.warp)}; there are ${height(value)}.`,
      {
        remedy: paired
          ? "Use every second slot, or a box with more clearance."
          : "Plan tape, ring or carrier here, or use every second slot.",
        figures: [
          {
            label: "Sag by small deflections",
            value: most,
            unit: "m",
            working: context.workings?.sag(plate) ?? null,
          },
          { label: "Warp", value: shape.warp, unit: "m" },
          { label: "Sag plus warp", value: most + shape.warp, unit: "m" },
        ],
        limit: clearance.limit,
      },
    ),
  ];
}

const grams = (value: number) => `${formatNumber(value * 1e3, { significant: 3, trim: true })}\u00a0g`;

function weighing({ flow }: RuleContext, state: StepState): Finding[] {
  const tool = state.step.equipment;
  if (!tool?.weightLimit) return [];
  const limit = statedLimit(`${tool.name}, weight`, tool.weightLimit, "kg");
  const unknown = state.after.bonds.find((bond) => carrierDensity(bond) === null);
  if (unknown)
    return [
      make(
        state,
        "cannot judge",
        `${tool.name} has a weight limit, and the density of ${unknown.carrier.name} is not given.`,
        {
          remedy: `Give the density of ${unknown.carrier.name}.`,
          limit,
        },
      ),
    ];
  const mass = arealMass(state.after, USUAL_GLASS_DENSITY) * Math.PI * (flow.wafer.diameter / 2) ** 2;
  const outcome = againstUpperLimit(mass, limit.value, 0, "do not run");
  return [
    make(state, outcome, `It weighs ${grams(mass)}; ${tool.name} takes ${grams(limit.value)}.`, {
      remedy: "Choose a lighter carrier or a tool that takes more.",
      figures: [{ label: "Weight", value: mass, unit: "kg" }],
      limit,
    }),
  ];
}

/** Silicon, films at their full height, bonding materials and carriers, m. */
function totalThickness({ silicon, bonds, ...wafer }: WaferState): number {
  const films = [...wafer.front, ...wafer.back].reduce((sum, { addition }) => sum + addition.thickness.value, 0);
  return bonds.reduce(
    (sum, { thickness, carrier }) => sum + thickness.value + carrier.thickness.value,
    silicon.value + films,
  );
}

function measuring(state: StepState): Finding[] {
  const tool = state.step.equipment;
  if (!tool?.totalThicknessLimit) return [];
  const limit: FindingLimit = statedLimit(`${tool.name}, total thickness`, tool.totalThicknessLimit, "m");
  const total = totalThickness(state.after);
  const outcome = againstUpperLimit(total, limit.value, 0, "do not run");
  return [
    make(state, outcome, `It is ${millimetres(total)} thick; ${tool.name} takes ${millimetres(limit.value)}.`, {
      remedy: "Choose a thinner carrier or a tool that takes more.",
      figures: [{ label: "Total thickness", value: total, unit: "m" }],
      limit,
    }),
  ];
}

function judge(context: RuleContext, state: StepState): Finding[] {
  const shape = state.atRoom;
  // On tape or frame the robot carries the frame, whose limits are its own.
  if (!shape) return [];
  return [...sagging(context, state, shape), ...weighing(context, state), ...measuring(state)];
}

export const sagRule: Rule = {
  number: 5,
  title: TITLE,
  judge,
};

export const aboutSag: RuleAbout = {
  asks: "Do sag under its own weight and warp together fit the slot or clearance, and the weight and total thickness of the pair the robot and aligner? Where this is stricter than the thickness rule, it decides.",
  limits: ["slotClear200", "slot200", "slotClear300", "slot300", "warpMargin"],
};
