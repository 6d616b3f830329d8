import type { StepInput } from "../flow/model.ts";
import type { WaferState } from "../flow/state.ts";
import type { SupportClass } from "../vocabulary.ts";
import { exceeds, reaches } from "./against-limit.ts";
import type { LimitKey, SiteLimits } from "./limits.ts";

/** Steps that a frame or tape line does on the tape itself, so that the wafer never stands free. */
const ON_FRAME = ["mount on frame", "debond", "clean", "dice", "measure", "store", "move", "hold"] as const;
const TAPE_IN_LINE = ["laminate tape", "grind", "stress relief", "mount on frame"] as const;

/** What the thickness rule needs to know of a step. */
export type SupportQuestion = Pick<StepInput, "kind" | "planned" | "peakTemperature" | "exposures" | "inLine">;

export interface RequiredSupport {
  support: SupportClass;
  /** why, as the end of 'needs … because' */
  because: string;
  /** the limit that the silicon is under, which is why nothing weaker will do; for bare silicon the one it is above */
  limit: LimitKey;
  /** the limit down to which this support will do; null for a carrier */
  floor: LimitKey | null;
}

/** The limits of the diameter class of a wafer (m): 150, 200 or 300 mm; smaller ones count as 150 mm. Null above 300 mm. */
export function thicknessLimits(diameter: number): { bare: LimitKey; gripper: LimitKey } | null {
  if (!exceeds(diameter, 0.15)) return { bare: "bareFrom150", gripper: "gripperFrom150" };
  if (!exceeds(diameter, 0.2)) return { bare: "bareFrom200", gripper: "gripperFrom200" };
  if (!exceeds(diameter, 0.3)) return { bare: "bareFrom300", gripper: "gripperFrom300" };
  return null;
}

/** What a step does that thin silicon cannot take on tape, or null. A debond's own heat is for the debond rule. */
export function demandingProcess(step: SupportQuestion, tapeTemperature: number): string | null {
  if (step.kind === "debond") return null;
  if (step.kind === "pattern") return "lithography";
  if (step.kind === "plate") return "plating";
  if (step.kind === "polish") return "polishing";
  if (exceeds(step.peakTemperature, tapeTemperature)) return "heat";
  if (step.exposures.includes("plasma")) return "plasma";
  if (step.exposures.includes("vacuum") && step.kind !== "bond") return "vacuum";
  return null;
}

const includes = (kinds: readonly string[], step: SupportQuestion) => kinds.includes(step.kind);

/**
 * The weakest support that a step may have at a silicon thickness (m), by diameter, thickness and what the step does.
 * Null for a diameter that the rule does not know.
 */
export function requiredSupport(
  thickness: number,
  diameter: number,
  step: SupportQuestion,
  mount: WaferState["mount"],
  limits: SiteLimits,
): RequiredSupport | null {
  const byDiameter = thicknessLimits(diameter);
  if (!byDiameter) return null;
  const { bare, gripper } = byDiameter;
  const isAtLeast = (key: LimitKey) => reaches(thickness, limits[key].value);
  const process = demandingProcess(step, limits.tapeTemperature.value);
  if (process && !isAtLeast("processCarrierBelow")) {
    // A ring stands over the face: no focus on a stepper, no lamination.
    if (step.planned === "edge ring" && step.kind !== "pattern" && isAtLeast("edgeRingLeast"))
      return {
        support: "tape or ring",
        because: "an edge ring takes it",
        limit: "processCarrierBelow",
        floor: "edgeRingLeast",
      };
    const because = `${process} on silicon this thin needs a carrier`;
    return { support: "carrier", because, limit: "processCarrierBelow", floor: null };
  }
  if (isAtLeast(bare)) return { support: "bare", because: "the silicon is thick enough", limit: bare, floor: bare };
  if (isAtLeast(gripper))
    return { support: "thin-wafer gripper", because: "it is too thin to be lifted bare", limit: bare, floor: gripper };
  if (isAtLeast("carrierBelow"))
    return { support: "tape or ring", because: "it is too thin for a gripper", limit: gripper, floor: "carrierBelow" };
  if (mount === "film frame" && includes(ON_FRAME, step))
    return { support: "tape or ring", because: "it stays on its frame", limit: "carrierBelow", floor: null };
  if (mount !== null && step.inLine !== false && includes(TAPE_IN_LINE, step) && isAtLeast("tapeInLineFrom"))
    return {
      support: "tape or ring",
      because: "it stays on tape, in line",
      limit: "carrierBelow",
      floor: "tapeInLineFrom",
    };
  const because = "silicon this thin no longer carries its own shape";
  return { support: "carrier", because, limit: "carrierBelow", floor: null };
}
