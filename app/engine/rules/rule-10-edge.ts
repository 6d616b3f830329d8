import type { StepState } from "../flow/walk.ts";
import { againstLowerLimit, exceeds, reaches } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit } from "./make-finding.ts";
import { laterSteps } from "./other-steps.ts";
import { thinnest } from "./rule-01-thickness.ts";
import { micrometres } from "./words.ts";

const TITLE = "Edge and ground face";
const make = findingsOf(10, TITLE);

const THINS = ["grind", "stress relief", "polish", "via reveal"];
const RELIEVES = ["stress relief", "polish", "via reveal"];

/** Least and most silicon that the rest of the flow leaves, tolerance included, m; null when nothing thins it any more. */
function finalSilicon({ steps }: RuleContext, from: number): { least: number; most: number } | null {
  const thinned = steps.slice(from).filter(({ step }) => step.siliconAfter !== null);
  const last = thinned.at(-1);
  if (!last) return null;
  const { value, tolerance } = last.after.silicon;
  return { least: value - (tolerance ?? 0), most: value + (tolerance ?? 0) };
}

/** The trim against what the flow leaves: shallower than that it has done nothing, and the rim is a knife edge. */
function trimDepth(context: RuleContext, state: StepState): Finding[] {
  const { edgeTrim } = state.step;
  if (state.step.kind !== "edge trim" || !edgeTrim || state.before.ground) return [];
  const final = finalSilicon(context, state.number);
  if (!final) return [];
  const { limits } = context;
  const depth = edgeTrim.depth.value - (edgeTrim.depth.tolerance ?? 0);
  const reserve = limits.trimReserve.value;
  const knife = reaches(final.most, depth);
  // Between the final silicon and its reserve it is a caution, and so is exactly the reserve.
  const outcome = knife ? "do not run" : exceeds(depth - final.most, reserve) ? "clear" : "caution";
  const left = depth - final.most;
  const trimmed = `Trimmed ${edgeTrim.depth.tolerance ? "at least " : ""}${micrometres(depth)} deep`;
  return [
    make(
      state,
      outcome,
      knife
        ? `${trimmed}, at most ${micrometres(final.most)} of silicon stay: the grind leaves a knife edge.`
        : `${trimmed} for at most ${micrometres(final.most)} of silicon: ${micrometres(left)} deeper, at least ${micrometres(reserve)} asked.`,
      {
        remedy: `Trim at least ${micrometres(final.most + reserve)} deep.`,
        figures: [
          { label: "Trim depth", value: depth, unit: "m" },
          { label: "Deeper than the final silicon by", value: left, unit: "m" },
        ],
        limit: siteLimit(limits, "trimReserve"),
      },
    ),
  ];
}

/** A rounded rim that is ground thin becomes a blade. */
function untrimmed({ limits }: RuleContext, state: StepState): Finding[] {
  if (!THINS.includes(state.step.kind) || !state.step.siliconAfter || state.before.trim) return [];
  const least = thinnest(state);
  const { trimBelow, trimAdvisedBelow } = limits;
  const outcome = againstLowerLimit(least, trimBelow.value, trimAdvisedBelow.value - trimBelow.value, "do not run");
  if (outcome === "clear") return [];
  return [
    make(state, outcome, `Down to ${micrometres(least)} without an edge trim: the rounded rim becomes a knife edge.`, {
      remedy: "Trim the edge before the grind.",
      figures: silicon(state, least),
      limit: siteLimit(limits, outcome === "caution" ? "trimAdvisedBelow" : "trimBelow"),
    }),
  ];
}

const silicon = (state: StepState, least: number): Finding["figures"] => [
  { label: "Silicon, nominal", value: state.after.silicon.value, unit: "m" },
  { label: "Silicon, nominal minus tolerance", value: least, unit: "m" },
];

/** The damage of the last grind must come off before the wafer leaves what holds it. */
function relief({ steps, limits }: RuleContext, state: StepState): Finding[] {
  const { kind } = state.step;
  const least = thinnest(state);
  const { reliefBelow, reliefAdvisedBelow } = limits;
  if (RELIEVES.includes(kind) && state.before.ground && !state.before.relieved)
    return [
      make(state, "clear", `Stress relief done at ${micrometres(state.after.silicon.value)}.`, {
        figures: silicon(state, least),
      }),
    ];
  if (kind !== "grind") return [];
  const next = laterSteps(steps, state).find(
    ({ step }) => step.kind === "grind" || RELIEVES.includes(step.kind) || step.kind === "dice",
  );
  if (next && next.step.kind !== "dice") return [];
  const outcome = againstLowerLimit(
    least,
    reliefBelow.value,
    reliefAdvisedBelow.value - reliefBelow.value,
    "do not run",
  );
  if (outcome === "clear") return [];
  return [
    make(
      state,
      outcome,
      `Ground to ${micrometres(least)} and not relieved afterwards: the damage of the grind stays and breaks it.`,
      {
        remedy: "Add a stress relief after the grind.",
        figures: silicon(state, least),
        limit: siteLimit(limits, outcome === "caution" ? "reliefAdvisedBelow" : "reliefBelow"),
      },
    ),
  ];
}

export const edgeRule: Rule = {
  number: 10,
  title: TITLE,
  judge: (context, state) => [...trimDepth(context, state), ...untrimmed(context, state), ...relief(context, state)],
};

export const aboutEdge: RuleAbout = {
  asks: "Is the edge trimmed before the grind, deeper than the silicon that stays, and is the damage of the grind taken off where the silicon is thin?",
  limits: ["trimBelow", "trimAdvisedBelow", "trimReserve", "reliefBelow", "reliefAdvisedBelow"],
};
