import { bondedFace, bondOn, type BondState } from "../flow/bond.ts";
import { bondLetGo } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { SIDE_NAMES, type Outcome } from "../vocabulary.ts";
import { exceeds } from "./against-limit.ts";
import { bondsStaying, isBonded } from "./bonded.ts";
import type { RuleContext } from "./finding.ts";

interface Fault {
  /** default: do not run */
  outcome?: Outcome;
  reason: string;
  remedy: string;
}

/** One thing that an order of steps can get wrong; null when this step does not. */
export type Check = (state: StepState, context: RuleContext) => Fault | null;

const debondsUnbonded: Check = ({ step, before }) => {
  if (step.kind !== "debond" || bondLetGo(before, step)) return null;
  const side = step.debondFace && isBonded(before) ? SIDE_NAMES[step.debondFace] : null;
  return {
    reason: side
      ? `There is nothing to debond on the ${side}: the wafer is bonded by its ${SIDE_NAMES[bondedFace(before.bonds[0] ?? {})]} here.`
      : "There is nothing to debond: the wafer is not bonded here.",
    remedy: side
      ? "Say the other face at the debond, or leave it out."
      : "Add the bond before, or leave the debond out.",
  };
};

/** Between two carriers nobody is to guess which one goes. */
const debondsEither: Check = ({ step, before: { bonds } }) =>
  step.kind === "debond" && bonds.length > 1 && !step.debondFace
    ? {
        outcome: "cannot judge",
        reason: `It is between ${carriersOf(bonds)}, and which of them this debond lets go is not said; it is taken as the first.`,
        remedy: "Say at the debond which face it lets go.",
      }
    : null;

/** A second carrier on the other face is a transfer; it comes before the first one goes. */
const bondsTwice: Check = ({ step, before: { bonds } }) => {
  if (step.kind !== "bond" || bonds.length === 0) return null;
  if (bonds.length > 1)
    return {
      reason: `It already has two carriers, ${carriersOf(bonds)}.`,
      remedy: "Debond one of them before another bond.",
    };
  const there = step.bond && bondOn(bonds, bondedFace(step.bond));
  return there || !step.bond
    ? {
        reason: `It is already bonded to ${carriersOf(bonds)}${there ? ` by its ${SIDE_NAMES[bondedFace(there)]}` : ""}.`,
        remedy: "Debond first, or bond the other face for a transfer.",
      }
    : null;
};

/** The carriers of some bonds by name. */
export const carriersOf = (bonds: readonly BondState[]) => bonds.map(({ carrier }) => carrier.name).join(" and ");

/** What a carrier covers throughout the step is out of reach. */
const worksUnderCarrier: Check = (state) => {
  const { step, before } = state;
  for (const bond of bondsStaying(state)) {
    const face = bondedFace(bond);
    const thins = face === "back" && step.siliconAfter && exceeds(before.silicon.value, step.siliconAfter.value);
    const changes = [...step.adds, ...step.removes].some(({ side }) => side === face);
    if (thins || changes)
      return {
        reason: `It ${thins ? "thins" : "works on"} the ${SIDE_NAMES[face]}, which is bonded to ${bond.carrier.name}.`,
        remedy: "Do this step before that bond or after its debond.",
      };
  }
  return null;
};

/** Tape needs a face that no carrier covers. */
const mountsOnCarrier: Check = ({ step, before: { bonds } }) =>
  bonds.length > 1 && (step.kind === "laminate tape" || step.kind === "mount on frame")
    ? {
        reason: `Both faces are bonded, to ${carriersOf(bonds)}: there is none for the tape.`,
        remedy: "Debond one carrier first.",
      }
    : null;

/** What an order of steps can get wrong about carriers and the faces that they are on. */
export const BOND_CHECKS: readonly Check[] = [
  bondsTwice,
  debondsUnbonded,
  debondsEither,
  worksUnderCarrier,
  mountsOnCarrier,
];
