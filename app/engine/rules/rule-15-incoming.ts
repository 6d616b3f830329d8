import type { StepState } from "../flow/walk.ts";
import type { Measured } from "../measured.ts";
import { againstLowerLimit, againstUpperLimit } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, statedLimit } from "./make-finding.ts";
import { outcomeRank } from "../vocabulary.ts";
import { micrometres, wholeMicrometres } from "./words.ts";

const TITLE = "Incoming gate";
const make = findingsOf(15, TITLE);

const REASSESS = "Assess this lot with its own incoming figures, or hold it.";

function missing(state: StepState, lot: string, what: string): Finding {
  return make(state, "cannot judge", `The ${what} of lot ${lot} is not given, and the flow has a limit for it.`, {
    remedy: `Measure the ${what} and give it.`,
  });
}

/** A figure of the lot against the band value ± tolerance that the flow was assessed for. */
function inBand(
  state: StepState,
  lot: string,
  what: string,
  value: number,
  accepted: Measured,
  text: (value: number) => string,
) {
  const half = accepted.tolerance ?? 0;
  const outcomes = [
    againstUpperLimit(value, accepted.value + half, 0, "do not run"),
    againstLowerLimit(value, accepted.value - half, 0, "do not run"),
  ] as const;
  const outcome = outcomeRank(outcomes[0]) > outcomeRank(outcomes[1]) ? outcomes[0] : outcomes[1];
  return make(
    state,
    // A band without width is met by its own value alone: that is as assessed.
    half === 0 && outcome === "caution" ? "clear" : outcome,
    `${what} of lot ${lot}: ${text(value)}; assessed for ${text(accepted.value)} ± ${text(half)}.`,
    {
      remedy: REASSESS,
      figures: [{ label: what, value, unit: "m" }],
      limit: statedLimit(`${what}, assessed for`, accepted, "m"),
    },
  );
}

function judge({ flow, steps }: RuleContext, state: StepState): Finding[] {
  const lot = flow.gate?.lot;
  if (!lot || state.number !== gateStep(steps)) return [];
  const { bow, warp } = flow.gate ?? {};
  const found: Finding[] = [];
  if (bow)
    found.push(
      typeof lot.bow === "number"
        ? inBand(state, lot.name, "Bow", lot.bow, bow, wholeMicrometres)
        : missing(state, lot.name, "bow"),
    );
  if (warp)
    found.push(
      typeof lot.warp === "number" ? belowMost(state, lot.name, lot.warp, warp) : missing(state, lot.name, "warp"),
    );
  const { thickness } = flow.wafer;
  if (typeof lot.thickness === "number")
    found.push(inBand(state, lot.name, "Thickness", lot.thickness, thickness, micrometres));
  else found.push(missing(state, lot.name, "thickness"));
  return [...found, ...inspected(state, lot)];
}

/** The gate is the incoming measurement, else the receipt, else the first step. */
function gateStep(steps: readonly StepState[]): number {
  const taken = steps.filter(({ step }) => !step.skipped);
  const incoming =
    taken.find(({ step }) => step.kind === "measure") ?? taken.find(({ step }) => step.kind === "receive") ?? taken[0];
  return incoming?.number ?? 1;
}

function belowMost(state: StepState, lot: string, value: number, most: Measured): Finding {
  return make(
    state,
    againstUpperLimit(value, most.value, 0, "do not run"),
    `Warp of lot ${lot}: ${wholeMicrometres(value)}; assessed for at most ${wholeMicrometres(most.value)}.`,
    {
      remedy: REASSESS,
      figures: [{ label: "Warp", value, unit: "m" }],
      limit: statedLimit("Warp, assessed for", most, "m"),
    },
  );
}

type Lot = NonNullable<NonNullable<RuleContext["flow"]["gate"]>["lot"]>;

function inspected(state: StepState, lot: Lot): Finding[] {
  const found: Finding[] = [];
  if (lot.edgeChips === "found")
    found.push(
      make(state, "do not run", `Lot ${lot.name} has edge chips: thinned, it breaks there.`, {
        remedy: "Hold the lot and sort the chipped wafers out.",
      }),
    );
  else if (lot.edgeChips !== "none")
    found.push(
      make(state, "cannot judge", `The edges of lot ${lot.name} are not inspected.`, {
        remedy: "Inspect the edges for chips.",
      }),
    );
  if (lot.identity === "differs")
    found.push(
      make(state, "do not run", `The identity of lot ${lot.name} is not that of the flow.`, {
        remedy: "Hold the lot and clear up what it is.",
      }),
    );
  else if (lot.identity !== "matches")
    found.push(
      make(state, "cannot judge", `The identity of lot ${lot.name} is not checked.`, {
        remedy: "Read the wafer marks and compare them.",
      }),
    );
  return found;
}

export const incomingRule: Rule = {
  number: 15,
  title: TITLE,
  judge,
};

export const aboutIncoming: RuleAbout = {
  asks: "Does the lot come in as the flow was assessed: bow, warp, thickness, edges without chips, identity? Without a lot there is nothing to judge.",
  limits: [],
};
