import type { StepState } from "../flow/walk.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, temperatureFigure } from "./make-finding.ts";
import { stepsUpTo } from "./other-steps.ts";
import { againstExposures, type DecidedExposure } from "./resistance.ts";
import { onTape, tapeHeatLimit, tapeName } from "./tape.ts";
import { capital, celsius } from "./words.ts";

const TITLE = "What the tape stands";
const make = findingsOf(16, TITLE);

const REMEDY = "Take the tape off before this step, plan a carrier, or choose a tape that stands it.";

/** The debond's heat is the debond rule's. */
function heat({ limits }: RuleContext, state: StepState): Finding[] {
  const peak = state.step.peakTemperature;
  if (state.step.kind === "debond" || !exceeds(peak, ROOM_TEMPERATURE)) return [];
  const limit = tapeHeatLimit(state.after, limits);
  const outcome = againstUpperLimit(peak, limit.value, 0, "do not run");
  const takes = `${tapeName(state.after)} takes ${celsius(limit.value)}`;
  return [
    make(state, outcome, `${celsius(peak)}; ${takes}.`, {
      remedy: `Stay below ${celsius(limit.value)} on tape, or plan a carrier for this step.`,
      figures: [temperatureFigure("Peak temperature", peak)],
      limit,
    }),
  ];
}

/** Without data of its own a tape goes into no vacuum, and few solvents. The remover after a debond is the debond rule's. */
function exposures({ steps }: RuleContext, state: StepState): Finding[] {
  const cleaned = state.step.kind === "clean" && stepsUpTo(steps, state).some(({ step }) => step.kind === "debond");
  const elsewhere: DecidedExposure[] = ["ultraviolet light", ...(cleaned ? (["solvent"] as const) : [])];
  const name = capital(tapeName(state.after));
  return againstExposures(state.step, state.after.tape?.resistances, elsewhere).map(({ exposure, outcome, says }) => {
    if (outcome !== null) return make(state, outcome, `${name} ${says}.`, { remedy: REMEDY });
    return exposure === "vacuum" || exposure === "plasma"
      ? make(state, "do not run", `${name} does not go into ${exposure} unless its own data say so.`, {
          remedy: REMEDY,
        })
      : make(state, "caution", `${name} ${says}.`, { remedy: `Give what the tape does in ${exposure}.` });
  });
}

/** Light that lets the tape go early. Dicing done, it is what the light is for. */
function light(state: StepState): Finding[] {
  const { step, after, before } = state;
  if (!step.exposures.includes("ultraviolet light") || before.diced || step.kind === "mount on frame") return [];
  const { tape } = after;
  const name = capital(tapeName(after));
  if (!tape)
    return [
      make(state, "caution", `${name} sees ultraviolet light, and whether that lets it go is not given.`, {
        remedy: "Say whether ultraviolet light lets the tape go.",
      }),
    ];
  if (tape.releasesInLight !== true) return [];
  return [
    make(state, "do not run", `${name} lets go in ultraviolet light, before the wafer is diced.`, { remedy: REMEDY }),
  ];
}

function judge(context: RuleContext, state: StepState): Finding[] {
  if (!onTape(state.after)) return [];
  return [...heat(context, state), ...exposures(context, state), ...light(state)];
}

export const tapeRule: Rule = {
  number: 16,
  title: TITLE,
  judge,
};

export const aboutTape: RuleAbout = {
  asks: "Does the tape or frame stand the heat, vacuum, chemicals and light of the step? Its own data decide where there are any. Days on tape are the clocks' rule, bumps in its embedding layer the cover rule.",
  limits: ["tapeTemperature"],
};
