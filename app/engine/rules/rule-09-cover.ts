import type { Measured } from "../measured.ts";
import type { BondState } from "../flow/bond.ts";
import type { StepState } from "../flow/walk.ts";
import { bumpCover } from "../thickness-budget/bump-cover.ts";
import { thicknessBudget, type ThicknessContribution } from "../thickness-budget/thickness-budget.ts";
import { outcomeRank, type Outcome } from "../vocabulary.ts";
import { againstLowerLimit, againstUpperLimit, exceeds } from "./against-limit.ts";
import type { Finding, FindingLimit, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit } from "./make-finding.ts";
import { hasBumps } from "./solder.ts";
import { micrometres, percent } from "./words.ts";

const TITLE = "Cover and thickness budget";
const make = findingsOf(9, TITLE);

const worse = (a: Outcome, b: Outcome) => (outcomeRank(b) > outcomeRank(a) ? b : a);

/** What a bond or a grinding tape has to take up, and what it has for it. */
interface Cover {
  feature: Measured;
  featureName: string;
  cover: number;
  coverName: string;
}

/** Tallest feature of the device side, bumps first; null when none is known. */
function tallest({ after: { bumps, topography } }: StepState): Pick<Cover, "feature" | "featureName"> | null {
  if (bumps) return { feature: bumps.height, featureName: "Bumps" };
  return topography && { feature: topography, featureName: "Topography" };
}

function unknownHeight(state: StepState): Finding {
  return make(state, "cannot judge", "There are bumps on the device side and their height is not given.", {
    remedy: "Give the height of the bumps at the step that makes them.",
  });
}

/** A bond covers the face that it is on, a grinding tape the device side. */
function covering(context: RuleContext, state: StepState): Finding[] {
  const { steps } = context;
  const { step, before } = state;
  const feature = tallest(state);
  if (step.kind === "bond" && step.bond && (step.bond.face ?? "front") === "front" && !before.bond) {
    if (feature)
      return [
        against(context, state, { ...feature, cover: step.bond.thickness.value, coverName: step.bond.material.name }),
      ];
    return hasBumps(steps, state) ? [unknownHeight(state)] : [];
  }
  if (step.kind !== "laminate tape") return [];
  if (!state.after.bumps) return hasBumps(steps, state) ? [unknownHeight(state)] : [];
  if (!feature) return [];
  const depth = step.tape?.embeddingDepth;
  if (!depth)
    return [
      make(
        state,
        "cannot judge",
        `Bumps of ${micrometres(feature.feature.value)} go into the grinding tape, and the depth that it takes up is not given.`,
        { remedy: "Give the depth of the tape's embedding layer, zero when it has none." },
      ),
    ];
  if (!(depth.value > 0))
    return [
      make(
        state,
        "do not run",
        `The grinding tape takes up no bumps; here they are ${micrometres(feature.feature.value)} high.`,
        {
          remedy: "Use a tape with an embedding layer, or grind before the bumps are made.",
        },
      ),
    ];
  return [against(context, state, { ...feature, cover: depth.value, coverName: "the embedding layer" })];
}

/** Over the share is a caution while enough is left over the bumps; too little left fails. Tallest: height plus tolerance. */
function against(
  { limits, workings }: RuleContext,
  state: StepState,
  { feature, featureName, cover, coverName }: Cover,
): Finding {
  const height = feature.value + (feature.tolerance ?? 0);
  const input = { bumpHeight: height, adhesiveThickness: cover };
  const { ratio, left } = bumpCover(input);
  const byShare = againstUpperLimit(ratio, limits.coverShare.value, 0, "caution");
  const { coverLeft, coverLeftClear } = limits;
  const byLeft = againstLowerLimit(left, coverLeft.value, coverLeftClear.value - coverLeft.value, "do not run");
  const outcome = worse(byShare, byLeft);
  const covered = `${featureName} of ${micrometres(height)} in ${micrometres(cover)} of ${coverName}: ${percent(ratio)}`;
  return make(
    state,
    outcome,
    exceeds(0, left) ? `${covered}, so they stand out.` : `${covered}, ${micrometres(left)} left over them.`,
    {
      remedy: `Cover them thicker, at least ${micrometres(Math.max(height / limits.coverShare.value, height + coverLeftClear.value))}, or make them lower.`,
      figures: [
        {
          label: "Share of the cover that they take",
          value: ratio,
          unit: "1",
          working: workings?.bumpCover(input) ?? null,
        },
        { label: "Left over them", value: left, unit: "m" },
      ],
      limit: siteLimit(limits, outcomeRank(byLeft) > outcomeRank(byShare) ? "coverLeft" : "coverShare"),
    },
  );
}

const THINS = ["grind", "stress relief", "polish", "via reveal"];

/** Whether this step is the last that thins the silicon while it is on this carrier or tape. */
function isFinalThinning({ steps }: RuleContext, state: StepState): boolean {
  if (!state.step.siliconAfter || !THINS.includes(state.step.kind)) return false;
  for (const { step } of steps.slice(state.number)) {
    if (step.kind === "debond" || step.kind === "mount on frame") return true;
    if (step.siliconAfter && THINS.includes(step.kind)) return false;
  }
  return true;
}

/** The variation that the thinning since the bond has added: stated at the last step that states one. */
function grindVariation({ steps }: RuleContext, state: StepState): Measured | null {
  const bonded = steps
    .slice(0, state.number)
    .findLastIndex(({ step }) => step.kind === "bond" || step.kind === "laminate tape");
  const thinning = steps.slice(bonded + 1, state.number).findLast(({ step }) => step.thicknessVariation);
  return thinning?.step.thicknessVariation ?? null;
}

const adhesiveVariation = ({ thicknessVariation, thickness, material }: BondState): number | null =>
  thicknessVariation?.value ??
  (material.thicknessVariationShare ? material.thicknessVariationShare.value * thickness.value : null);

function budget(context: RuleContext, state: StepState): Finding[] {
  if (!isFinalThinning(context, state)) return [];
  const { bond, tape } = state.after;
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
  asks: "Is what stands on the device side covered by adhesive or embedding layer, with enough left over it, and does the thickness variation of carrier, adhesive and grind stay within a tenth of the final silicon and the protrusion of its vias?",
  limits: ["coverShare", "coverLeft", "coverLeftClear"],
};
