import { chuckFlattening, type ChuckFlatteningInput } from "../chuck/chuck-flattening.ts";
import type { EquipmentInput } from "../flow/model.ts";
import { edgesUp, type LyingShape } from "../flow/shape.ts";
import { bondLetGo, faceUpLoaded, type WaferState } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { bendingStress } from "../strength/bending.ts";
import { againstUpperLimit } from "./against-limit.ts";
import { bondLeft, isBonded } from "./bonded.ts";
import type { Figure, Finding, FindingLimit, Rule, RuleAbout, RuleContext } from "./finding.ts";
import type { LimitKey, SiteLimits } from "./limits.ts";
import { findingsOf, siteLimit, statedLimit } from "./make-finding.ts";
import { previousStep } from "./other-steps.ts";
import { thinnest } from "./rule-01-thickness.ts";
import { height, megapascals } from "./words.ts";

const TITLE = "Holding it flat";
const make = findingsOf(4, TITLE);

/** A usual vacuum, Pa (common practice, no source): the force of any is far beyond what flattens a wafer. */
const CHUCK_VACUUM = 80e3;

interface Loaded {
  shape: LyingShape;
  /** whether the rim lifts off the chuck; else the centre does */
  rimLifts: boolean;
  wafer: WaferState;
}

/** The wafer as it comes to the tool; null when tape or frame holds it flat, and at the first step. */
function asLoaded({ steps }: RuleContext, state: StepState): Loaded | null {
  const previous = previousStep(steps, state);
  if (!previous?.atRoom) return null;
  return {
    shape: previous.atRoom,
    rimLifts: edgesUp(previous.atRoom, faceUpLoaded(state.before, state.step)),
    wafer: previous.after,
  };
}

/** What the gap under a wafer is held against: the tool's own, else the site's for its kind of seal; null without a seal. */
function sealOf(tool: EquipmentInput, limits: SiteLimits): { limit: FindingLimit; margin: number } | null {
  if (tool.clamping !== "vacuum" && tool.clamping !== "full-area vacuum") return null;
  if (tool.sealGap)
    return {
      limit: statedLimit(`${tool.name}, gap that its seal closes`, tool.sealGap, "m"),
      margin: tool.sealGap.value * limits.warpMargin.value,
    };
  // A full-area chuck has no groove, so without data of its own the tool's warp limit says it all.
  if (tool.clamping === "full-area vacuum" && !tool.seal) return null;
  const [most, clear]: [LimitKey, LimitKey] =
    tool.seal === "compliant" ? ["sealGapCompliant", "sealGapCompliantClear"] : ["sealGapPlain", "sealGapPlainClear"];
  return { limit: siteLimit(limits, most), margin: limits[most].value - limits[clear].value };
}

function sealing({ limits }: RuleContext, state: StepState, tool: EquipmentInput, loaded: Loaded): Finding[] {
  const seal = sealOf(tool, limits);
  if (!seal) return [];
  const gap = loaded.shape.warp;
  const outcome = againstUpperLimit(gap, seal.limit.value, seal.margin, "do not run");
  const place = loaded.rimLifts ? "rim" : "centre";
  return [
    make(
      state,
      outcome,
      `The ${place} lies ${height(gap)} off the chuck; the seal of ${tool.name} closes ${height(seal.limit.value)}. Once it seals, the force is enough.`,
      {
        remedy: "Lower the bow, use a chuck with a compliant seal, or press the rim down while the vacuum builds up.",
        figures: [{ label: `Gap under the ${place}`, value: gap, unit: "m" }],
        limit: seal.limit,
      },
    ),
  ];
}

/** Design stress of the wafer's edge as it is, with the margin below it that is a caution. */
function stressLimit(wafer: WaferState, limits: SiteLimits): { limit: FindingLimit; margin: number } {
  return wafer.trim !== null && wafer.relieved
    ? { limit: siteLimit(limits, "stressRelieved"), margin: 0 }
    : { limit: siteLimit(limits, "stressGround"), margin: limits.stressGround.value - limits.stressGroundClear.value };
}

const FLATTENS = ["vacuum", "full-area vacuum", "electrostatic", "clamp ring"];

/** Bending from free to flat, Pa. A roll is opened as a cylinder of its own radius, a bowl as a sphere. */
function flatteningFigure({ flow, workings }: RuleContext, { shape, wafer }: Loaded): Figure {
  const { diameter, orientation } = flow.wafer;
  const radius = diameter / 2;
  const label = "Bending stress from free to flat";
  if (shape.rollRadius !== null && !isBonded(wafer)) {
    const roll = { thickness: wafer.silicon.value, radiusOfCurvature: shape.rollRadius, direction: "110" as const };
    return { label, value: bendingStress(roll), unit: "Pa", working: workings?.bendingStress(roll) ?? null };
  }
  const input: ChuckFlatteningInput = {
    radius,
    thickness: shape.disc.thickness,
    biaxialModulus: siliconBiaxialModulus(orientation),
    poissonsRatio: shape.disc.poissonsRatio,
    curvature: (2 * shape.sagitta) / radius ** 2,
    vacuum: CHUCK_VACUUM,
  };
  const value = chuckFlattening(input).surfaceStress;
  return { label, value, unit: "Pa", working: workings?.chuckStress(input) ?? null };
}

function stressed(
  { limits }: RuleContext,
  state: StepState,
  wafer: WaferState,
  figure: Figure,
  where: string,
  remedy: string,
): Finding {
  const { limit, margin } = stressLimit(wafer, limits);
  const outcome = againstUpperLimit(figure.value, limit.value, margin, "do not run");
  const edge = wafer.trim !== null && wafer.relieved ? "relieved and trimmed" : "ground";
  return make(
    state,
    outcome,
    `${where} it is bent to ${megapascals(figure.value)}; a wafer with a ${edge} edge is handled up to ${megapascals(limit.value)}.`,
    { remedy, figures: [figure], limit },
  );
}

/** Curvature, 1/m, of what is flat but for rounding, such as a wafer between two carriers that are alike: 10 pm over a wafer. */
const FLAT = 1e-9;

/** A stiff sphere of twice the curvature would still be clear: then the chuck's contact is not worth its time. */
function farFromBreaking({ shape, wafer }: Loaded, radius: number, limits: SiteLimits): boolean {
  const { limit, margin } = stressLimit(wafer, limits);
  const thickness = Math.max(shape.disc.thickness, wafer.silicon.value);
  const curvature = Math.max((2 * Math.abs(shape.sagitta)) / radius ** 2, 1 / (shape.rollRadius ?? Infinity));
  if (curvature < FLAT) return true;
  if (2 * curvature * thickness > 1) return false;
  const stress = bendingStress({ thickness, radiusOfCurvature: 1 / (2 * curvature), direction: "biaxial" });
  return stress < limit.value - margin;
}

/** Flattening of a whole wafer hardly ever counts, so it is said only where it does. */
function flattening(context: RuleContext, state: StepState, loaded: Loaded): Finding[] {
  const { diameter } = context.flow.wafer;
  const gripped = state.step.planned === "thin-wafer gripper";
  if (!gripped && !FLATTENS.includes(state.step.equipment?.clamping ?? "")) return [];
  if (farFromBreaking(loaded, diameter / 2, context.limits)) return [];
  const figure = flatteningFigure(context, loaded);
  const found = stressed(
    context,
    state,
    loaded.wafer,
    figure,
    gripped ? "In the gripper" : "On the chuck",
    "Lower the film force, or relieve and trim the wafer before this step.",
  );
  return found.outcome === "clear" ? [] : [found];
}

/** The wafer bends at the peel front to the radius that the debonder gives it, unless another carrier keeps it straight. */
function peeling(context: RuleContext, state: StepState): Finding[] {
  const material = bondLetGo(state.before, state.step)?.material;
  if (!material?.release.includes("peel") || !material.peelRadius || bondLeft(state)) return [];
  const bend = {
    thickness: Math.max(thinnest(state), 1e-9),
    radiusOfCurvature: material.peelRadius.value,
    direction: "110" as const,
  };
  const figure: Figure = {
    label: "Bending stress at the peel front",
    value: bendingStress(bend),
    unit: "Pa",
    working: context.workings?.bendingStress(bend) ?? null,
  };
  const where = `At the peel front, radius ${height(material.peelRadius.value)},`;
  return [stressed(context, state, state.before, figure, where, "Peel with a larger radius, or release by light.")];
}

function judge(context: RuleContext, state: StepState): Finding[] {
  const loaded = asLoaded(context, state);
  const tool = state.step.equipment;
  return [
    ...(tool && loaded ? sealing(context, state, tool, loaded) : []),
    ...(loaded ? flattening(context, state, loaded) : []),
    ...peeling(context, state),
  ];
}

export const holdingRule: Rule = {
  number: 4,
  title: TITLE,
  judge,
};

export const aboutHolding: RuleAbout = {
  asks: "Does the gap under the wafer as it is loaded stay within what the chuck's seal closes, and the bending at chuck, gripper and peel front below the design stress of its edge? Pressure is never the limit.",
  limits: [
    "sealGapPlainClear",
    "sealGapPlain",
    "sealGapCompliantClear",
    "sealGapCompliant",
    "warpMargin",
    "stressGroundClear",
    "stressGround",
    "stressRelieved",
  ],
};
