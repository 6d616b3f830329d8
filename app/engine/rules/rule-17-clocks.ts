import type { StepKind } from "../flow/model.ts";
import { allFilms } from "../flow/state.ts";
import { heatDuration } from "../flow/temperature-profile.ts";
import type { StepState } from "../flow/walk.ts";
import { againstUpperLimit, exceeds, reaches } from "./against-limit.ts";
import { isBonded } from "./bonded.ts";
import type { Finding, FindingLimit, Rule, RuleAbout, RuleContext } from "./finding.ts";
import type { LimitKey } from "./limits.ts";
import { findingsOf, siteLimit, statedLimit } from "./make-finding.ts";
import { earlierSteps, nextStep, stepsUpTo } from "./other-steps.ts";
import { capital, duration } from "./words.ts";

const TITLE = "Moisture and clocks";
const make = findingsOf(17, TITLE);

/**
 * Time from the end of one step to the start of a later one, s; `complete` is false where a time in between is not given. Steps that
 * the wafer skips count: it waits while the other slots take them.
 */
function elapsed(steps: readonly StepState[], from: StepState, to: StepState): { time: number; complete: boolean } {
  const between = steps.slice(from.number, to.number);
  const waits = between.map(({ step }) => step.timeSincePrevious ?? null);
  const work = between.slice(0, -1).reduce((sum, { step }) => sum + (heatDuration(step) ?? 0), 0);
  return {
    time: waits.reduce<number>((sum, wait) => sum + (wait ?? 0), work),
    complete: waits.every((wait) => wait !== null),
  };
}

/** A clock against its red line. Without times nothing is judged, and the red line is said. */
function clock(
  context: RuleContext,
  from: StepState,
  to: StepState,
  what: string,
  limit: FindingLimit,
  remedy: string,
): Finding {
  const { time, complete } = elapsed(context.steps, from, to);
  const margin = limit.value * context.limits.clockMargin.value;
  const outcome = againstUpperLimit(time, limit.value, margin, "do not run");
  const since = `${capital(what)} within ${duration(limit.value)}, counted from step ${from.number}`;
  if (!complete && outcome !== "do not run")
    return make(to, "clear", `${since}. Its red line: no times are planned here, so the floor keeps it.`, { limit });
  return make(to, outcome, `${since}; here ${duration(time)}.`, {
    remedy,
    figures: [{ label: capital(what), value: time, unit: "s" }],
    limit,
  });
}

/** The last step of a kind before one, with none of `instead` in between. */
function lastBefore(
  steps: readonly StepState[],
  state: StepState,
  kind: StepKind,
  instead: readonly StepKind[],
): StepState | null {
  for (const earlier of earlierSteps(steps, state).toReversed()) {
    if (earlier.step.kind === kind) return earlier;
    if (instead.includes(earlier.step.kind)) return null;
  }
  return null;
}

const RELIEVES: StepKind[] = ["stress relief", "polish", "via reveal"];

const SPANS: { from: StepKind; to: StepKind[]; instead: StepKind[]; what: string; limit: LimitKey; remedy: string }[] =
  [
    {
      from: "grind",
      to: RELIEVES,
      instead: RELIEVES,
      what: "grind to stress relief",
      limit: "reliefWithin",
      remedy: "Relieve sooner: the ground face goes on cracking.",
    },
    {
      from: "bond",
      to: ["grind"],
      instead: ["grind", "debond"],
      what: "bond to grind",
      limit: "grindWithin",
      remedy: "Grind sooner, or inspect the bond for voids and bake it before the grind.",
    },
    {
      from: "debond",
      to: ["clean"],
      instead: ["clean"],
      what: "debond to clean",
      limit: "cleanWithin",
      remedy: "Clean sooner: the residue hardens.",
    },
  ];

function spans(context: RuleContext, state: StepState): Finding[] {
  return SPANS.flatMap(({ from, to, instead, what, limit, remedy }) => {
    if (!to.includes(state.step.kind)) return [];
    const start = lastBefore(context.steps, state, from, instead);
    return start ? [clock(context, start, state, what, siteLimit(context.limits, limit), remedy)] : [];
  });
}

const PUTS_ON: StepKind[] = ["laminate tape", "mount on frame"];

/** Days on one tape, judged at the last step on it. */
function tapeTime(context: RuleContext, state: StepState): Finding[] {
  const { steps, limits } = context;
  const { mount, tape } = state.after;
  if (mount !== "grinding tape" && mount !== "film frame") return [];
  const next = nextStep(steps, state);
  if (next && next.after.mount === mount && !PUTS_ON.includes(next.step.kind)) return [];
  const start = stepsUpTo(steps, state).findLast(({ step }) => PUTS_ON.includes(step.kind));
  if (!start || start === state) return [];
  const limit = tape?.longestTime
    ? statedLimit(`${tape.name}, longest time on it`, tape.longestTime, "s")
    : siteLimit(limits, "tapeWithin");
  return [
    clock(
      context,
      start,
      state,
      `on ${mount}`,
      limit,
      "Move it on sooner: tape sticks harder with time and leaves residue.",
    ),
  ];
}

const WET = ["water", "solvent", "acid", "base"] as const;
const STANDS: StepKind[] = ["store", "hold", "receive", "move"];

/** The step that dried it last, null when it has been wet or stood about since. */
function driedAt({ steps, limits }: RuleContext, state: StepState): StepState | null {
  for (const earlier of earlierSteps(steps, state).toReversed()) {
    const { step } = earlier;
    if (reaches(step.peakTemperature, limits.dryFrom.value) || step.exposures.includes("vacuum")) return earlier;
    if (WET.some((exposure) => step.exposures.includes(exposure)) || STANDS.includes(step.kind)) return null;
  }
  return null;
}

/** Polymers and bonding materials take up water and give it off in vacuum. */
function moisture(context: RuleContext, state: StepState): Finding[] {
  const { step, before } = state;
  if (!step.exposures.includes("vacuum")) return [];
  const polymer = allFilms(before).some(({ addition: { film } }) => film.kind === "polymer");
  if (!polymer && !isBonded(before)) return [];
  const what = isBonded(before) ? "The bonding material" : "The polymer";
  const limit = siteLimit(context.limits, "dryFor");
  const remedy = "Bake it dry before this step.";
  if (step.dehydrationBake === true) return [make(state, "clear", `${what} is baked dry before the vacuum.`)];
  const dried = driedAt(context, state);
  if (dried) {
    const { time } = elapsed(context.steps, dried, state);
    if (!exceeds(time, limit.value)) return [];
    return [
      make(
        state,
        "caution",
        `${what} was dry after step ${dried.number}, ${duration(time)} ago; that lasts ${duration(limit.value)}.`,
        {
          remedy,
          figures: [{ label: "Time since it was dry", value: time, unit: "s" }],
          limit,
        },
      ),
    ];
  }
  return step.dehydrationBake === false
    ? [make(state, "do not run", `${what} goes into vacuum wet: no bake is planned.`, { remedy })]
    : [
        make(
          state,
          "caution",
          `${what} has been wet or stored, and whether it is baked before the vacuum is not given.`,
          { remedy },
        ),
      ];
}

export const clocksRule: Rule = {
  number: 17,
  title: TITLE,
  judge: (context, state) => [...moisture(context, state), ...spans(context, state), ...tapeTime(context, state)],
};

export const aboutClocks: RuleAbout = {
  asks: "Is what takes up water baked before vacuum, and are the red lines kept: grind to stress relief, bond to grind, debond to clean, days on tape?",
  limits: ["reliefWithin", "grindWithin", "cleanWithin", "tapeWithin", "clockMargin", "dryFor", "dryFrom"],
};
