import type { BondState } from "../flow/bond.ts";
import type { BondingMaterialInput } from "../flow/model.ts";
import type { StepState } from "../flow/walk.ts";
import { againstUpperLimit } from "./against-limit.ts";
import type { Finding, RuleContext } from "./finding.ts";
import { findingsOf, statedLimit } from "./make-finding.ts";
import { forcePerWidth } from "./words.ts";

const make = findingsOf(8, "Debond on tape or ring");

/**
 * A peel pulls on the bumps (`bumped`: of the face that is peeled) and bends the silicon at its front; `left` is the bond that the
 * wafer stays on. What is not known of either is a caution, never a silent pass; the bend itself is judged by the holding rule
 * where its radius is given.
 */
export function peel(
  { limits }: RuleContext,
  state: StepState,
  { peelForce, peelRadius }: BondingMaterialInput,
  { bumped: bumps, left }: { bumped: boolean; left: BondState | null },
): Finding {
  const stands = state.before.bumps?.standsPeelForce ?? null;
  const missing = [
    // On another carrier the wafer does not bend to the radius that it has on tape: the carriers bend.
    ...(left
      ? ["how far the two carriers bend at the peel front"]
      : peelRadius
        ? []
        : ["the bend radius at the peel front"]),
    ...(bumps && !peelForce ? ["the peel force"] : []),
    ...(bumps && !stands ? ["the force that the bumps stand"] : []),
  ];
  if (bumps && peelForce && stands) {
    const margin = stands.value * limits.warpMargin.value;
    const outcome = againstUpperLimit(peelForce.value, stands.value, margin, "do not run");
    if (missing.length === 0 || outcome === "do not run")
      return make(
        state,
        outcome,
        `The peel pulls with ${forcePerWidth(peelForce.value)}; the bumps stood ${forcePerWidth(stands.value)} in a trial.`,
        {
          remedy: "Peel with less force, or choose a bond that lets go by light or solvent.",
          figures: [{ label: "Peel force per width", value: peelForce.value, unit: "N/m" }],
          limit: statedLimit("Peel force that the bumps stand", stands, "N/m"),
        },
      );
  }
  if (missing.length === 0)
    return make(state, "clear", "It is peeled off; there are no bumps, and the bend at the peel front is known.");
  const known =
    missing.length > 1 ? `${missing.slice(0, -1).join(", ")} and ${missing.at(-1)} are` : `${missing[0]} is`;
  return make(
    state,
    "caution",
    `It is peeled off: ${known} not given, so pull and bend at the peel front cannot be judged.`,
    {
      remedy: left
        ? "Let the first bond go by light or solvent, or show in a trial that carriers and silicon stand the bend of this peel."
        : "Give the peel force and bend radius, check the peel force against the bumps, and the bend against the silicon left.",
    },
  );
}
