import type { Measured } from "../measured.ts";
import { bondedFace } from "../flow/bond.ts";
import type { StepState } from "../flow/walk.ts";
import { bumpCover } from "../thickness-budget/bump-cover.ts";
import { outcomeRank, type Outcome } from "../vocabulary.ts";
import { againstLowerLimit, againstUpperLimit, exceeds } from "./against-limit.ts";
import { bondMade } from "./bonded.ts";
import type { Finding, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit } from "./make-finding.ts";
import { earlierSteps } from "./other-steps.ts";
import { hasBumps } from "./solder.ts";
import { onTape } from "./tape.ts";
import { micrometres, percent } from "./words.ts";

const make = findingsOf(9, "Cover and thickness budget");

const worse = (a: Outcome, b: Outcome) => (outcomeRank(b) > outcomeRank(a) ? b : a);

/** What a bond or a tape has to take up, and what it has for it. */
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

/** A bond covers the face that it is on, a tape too: grinding tape the device side, a frame the side that no carrier covers. */
export function covering(context: RuleContext, state: StepState): Finding[] {
  const made = bondMade(state);
  if (made) {
    const cover = { cover: made.thickness.value, coverName: made.material.name };
    return bondedFace(made) === "front" ? overDeviceSide(context, state, cover) : overBackSide(context, state, cover);
  }
  const { kind, tape } = state.step;
  const taped = kind === "laminate tape" || (kind === "mount on frame" && onTape(state.after));
  return taped && state.after.mountedSide === "front" ? inTape(context, state, tape?.embeddingDepth ?? null) : [];
}

function overDeviceSide(context: RuleContext, state: StepState, cover: Omit<Cover, "feature" | "featureName">) {
  const feature = tallest(state);
  if (feature) return [against(context, state, { ...feature, ...cover })];
  return hasBumps(context.steps, state) ? [unknownHeight(state)] : [];
}

/** On the back side stands what a via reveal has left standing, by the last step that says how far. */
function overBackSide(context: RuleContext, state: StepState, cover: Omit<Cover, "feature" | "featureName">) {
  const earlier = earlierSteps(context.steps, state).map(({ step }) => step);
  const feature = earlier.findLast(({ viaProtrusion }) => viaProtrusion)?.viaProtrusion;
  if (feature) return feature.value > 0 ? [against(context, state, { feature, featureName: "Vias", ...cover })] : [];
  if (!earlier.some(({ kind }) => kind === "via reveal")) return [];
  return [
    make(state, "cannot judge", "Vias stand out of the back side and how far is not given.", {
      remedy: "Give how far the vias stand out at the step that reveals them.",
    }),
  ];
}

function inTape(context: RuleContext, state: StepState, depth: Measured | null): Finding[] {
  const tape = state.after.mount === "film frame" ? "dicing tape" : "grinding tape";
  const feature = tallest(state);
  if (!state.after.bumps) return hasBumps(context.steps, state) ? [unknownHeight(state)] : [];
  if (!feature) return [];
  if (!depth)
    return [
      make(
        state,
        "cannot judge",
        `Bumps of ${micrometres(feature.feature.value)} go into the ${tape}, and the depth that it takes up is not given.`,
        { remedy: "Give the depth of the tape's embedding layer, zero when it has none." },
      ),
    ];
  if (!(depth.value > 0))
    return [
      make(
        state,
        "do not run",
        `The ${tape} takes up no bumps; here they are ${micrometres(feature.feature.value)} high.`,
        {
          remedy:
            tape === "dicing tape"
              ? "Use a tape with an embedding layer."
              : "Use a tape with an embedding layer, or grind before the bumps are made.",
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
