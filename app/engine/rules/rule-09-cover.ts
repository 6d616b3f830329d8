import type { Measured } from "../measured.ts";
import { bondOn, type BondState } from "../flow/bond.ts";
import type { StepState } from "../flow/walk.ts";
import { thicknessBudget, type ThicknessContribution } from "../thickness-budget/thickness-budget.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import { covering } from "./cover.ts";
import type { Finding, FindingLimit, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf } from "./make-finding.ts";
import { laterSteps, stepsUpTo } from "./other-steps.ts";
import { micrometres } from "./words.ts";

const TITLE = "Cover and thickness budget";
const make = findingsOf(9, TITLE);

const THINS = ["grind", "stress relief", "polish", "via reveal"];

/** Whether this step is the last that thins the silicon while it is on this carrier or tape. */
function isFinalThinning({ steps }: RuleContext, state: StepState): boolean {
  if (!state.step.siliconAfter || !THINS.includes(state.step.kind)) return false;
  for (const { step } of laterSteps(steps, state)) {
    if (step.kind === "debond" || step.kind === "mount on frame") return true;
    if (step.siliconAfter && THINS.includes(step.kind)) return false;
  }
  return true;
}

/** The variation that the thinning since the bond has added: stated at the last step that states one. */
function grindVariation({ steps }: RuleContext, state: StepState): Measured | null {
  const soFar = stepsUpTo(steps, state);
  const bonded = soFar.findLastIndex(({ step }) => step.kind === "bond" || step.kind === "laminate tape");
  const thinning = soFar.slice(bonded + 1).findLast(({ step }) => step.thicknessVariation);
  return thinning?.step.thicknessVariation ?? null;
}

const adhesiveVariation = ({ thicknessVariation, thickness, material }: BondState): number | null =>
  thicknessVariation?.value ??
  (material.thicknessVariationShare ? material.thicknessVariationShare.value * thickness.value : null);

function budget(context: RuleContext, state: StepState): Finding[] {
  if (!isFinalThinning(context, state)) return [];
  const { bonds, tape } = state.after;
  // It is thinned from its back side, so the carrier of its device side is what it stands on.
  const bond = bondOn(bonds, "front");
  const grind = grindVariation(context, state)?.value ?? null;
  const parts: { name: string; variation: number | null }[] = bond
    ? [
        { name: "carrier", variation: bond.carrier.thicknessVariation?.value ?? null },
        { name: "adhesive", variation: adhesiveVariation(bond) },
        { name: "grind", variation: grind },
      ]
    : [
        { name: "tape", variation: tape?.thicknessVariation?.value ?? null },
        { name: "grind", variation: grind },
      ];
  const known = parts.filter((part): part is ThicknessContribution => part.variation !== null);
  const missing = parts.filter(({ variation }) => variation === null).map(({ name }) => name);
  // On tape nobody asks for it unless the tape's own variation is known.
  if (!bond && missing.length > 0) return [];
  return [known.length === 0 ? unknownVariation(state, missing) : inBudget(context, state, known, missing)];
}

function unknownVariation(state: StepState, missing: string[]): Finding {
  return make(state, "cannot judge", `The thickness variation of ${missing.join(", ")} is not given.`, {
    remedy: "Give the thickness variation of carrier, adhesive and grind.",
  });
}

function inBudget(
  { workings }: RuleContext,
  state: StepState,
  contributions: ThicknessContribution[],
  missing: string[],
): Finding {
  const protrusion = state.step.viaProtrusion ?? null;
  const input = {
    contributions,
    finalThickness: state.after.silicon.value,
    viaProtrusion: protrusion && protrusion.value > 0 ? protrusion.value : undefined,
  };
  const { linear, rootSumSquare, allowed, governedBy } = thicknessBudget(input);
  const linearOutcome = againstUpperLimit(linear, allowed, 0, "caution");
  const outcome = exceeds(rootSumSquare, allowed) ? "do not run" : linearOutcome;
  const sum = contributions.map(({ name, variation }) => `${name} ${micrometres(variation)}`).join(" + ");
  const limit: FindingLimit = {
    label: governedBy === "via protrusion" ? "Protrusion of the vias" : "A tenth of the final thickness",
    value: allowed,
    unit: "m",
    source: "common practice, no source",
  };
  const figures: Finding["figures"] = [
    {
      label: "Thickness variation, linear",
      value: linear,
      unit: "m",
      working: workings?.thicknessBudget(input, "linear") ?? null,
    },
    {
      label: "Thickness variation, root-sum-square",
      value: rootSumSquare,
      unit: "m",
      working: workings?.thicknessBudget(input, "root sum square") ?? null,
    },
  ];
  const both = `${sum} = ${micrometres(linear)} linear, ${micrometres(rootSumSquare)} root-sum-square`;
  const vias =
    protrusion && governedBy !== "via protrusion" ? ` The vias stand ${micrometres(protrusion.value)} proud.` : "";
  const reason = `${both}, against ${micrometres(allowed)}, ${governedBy === "via protrusion" ? "what the vias stand proud" : "a tenth of the final thickness"}.${vias}`;
  const remedy = "Sort the carriers, use a thinner or more even adhesive, compensate the grind, or leave more silicon.";
  if (missing.length > 0 && outcome !== "do not run")
    return make(state, "cannot judge", `${reason} The variation of ${missing.join(", ")} is not given.`, {
      remedy: `Give the thickness variation of ${missing.join(", ")}.`,
      figures,
      limit,
    });
  return make(state, outcome, reason, { remedy, figures, limit });
}

export const coverRule: Rule = {
  number: 9,
  title: TITLE,
  judge: (context, state) => [...covering(context, state), ...budget(context, state)],
};

export const aboutCover: RuleAbout = {
  asks: "Is what stands on the face that is bonded or taped covered by adhesive or embedding layer, with enough left over it, and does the thickness variation of carrier, adhesive and grind stay within a tenth of the final silicon and the protrusion of its vias?",
  limits: ["coverShare", "coverLeft", "coverLeftClear"],
};
