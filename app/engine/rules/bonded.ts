import { bondedFace, bondOn, type BondState } from "../flow/bond.ts";
import type { WaferState } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import type { RuleContext } from "./finding.ts";

type Bonded = Pick<WaferState, "bonds">;

export const isBonded = ({ bonds }: Bonded) => bonds.length > 0;

/** What lies there, as the beginning of a sentence. */
export function whatLies({ bonds }: Bonded): "The wafer" | "The pair" | "The wafer between its carriers" {
  return bonds.length === 0 ? "The wafer" : bonds.length === 1 ? "The pair" : "The wafer between its carriers";
}

/** The bond that a step makes; null when it makes none. */
export function bondMade({ before, after }: Pick<StepState, "before" | "after">): BondState | null {
  return after.bonds.find((bond) => !bondOn(before.bonds, bondedFace(bond))) ?? null;
}

/** The bonds that are there before a step and after it. */
export function bondsStaying({ before, after }: Pick<StepState, "before" | "after">): BondState[] {
  return before.bonds.filter((bond) => bondOn(after.bonds, bondedFace(bond)));
}

/** The bonds that a rule is to ask about at a step: all, unless a search is about one and leaves the step as it is. */
export function bondsAsked(
  { tried }: RuleContext,
  { number }: StepState,
  bonds: readonly BondState[],
): readonly BondState[] {
  if (!tried || number === tried.from || number === tried.to) return bonds;
  return bonds.filter((bond) => bondedFace(bond) === tried.face);
}

/** The bond that holds the wafer once the step is done; null for one that is on no carrier then. */
export const bondLeft = ({ after }: Pick<StepState, "after">): BondState | null => after.bonds[0] ?? null;
