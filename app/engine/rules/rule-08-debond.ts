import type { StepState } from "../flow/walk.ts";
import { formatQuantity } from "../units/format.ts";
import { supportRank, type Outcome } from "../vocabulary.ts";
import { againstUpperLimit } from "./against-limit.ts";
import type { Finding, Rule, RuleContext } from "./finding.ts";
import { LIMIT_DEFINITIONS } from "./limits.ts";
import { requiredAt, thinnest } from "./rule-01-thickness.ts";

const TITLE = "Debond on tape or ring";

const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 });

function finding(state: StepState, outcome: Outcome, reason: string, remedy: string | null = null): Finding {
  return { rule: 8, title: TITLE, step: state.number, outcome, reason, figures: [], limit: null, remedy };
}

/** A wafer that leaves its carrier thin must already be on tape or ring, and that must stand the debond and the clean after it. */
function judge(context: RuleContext, state: StepState): Finding[] {
  const { kind } = state.step;
  if (kind === "mount on frame") return mounting(state);
  if (kind === "clean") return remover(context, state);
  if (kind !== "debond" || !state.before.bond) return [];
  return [
    leavesCarrier(context, state),
    ...(state.before.mount === "film frame" ? [heatOnTape(context, state)] : []),
    ...(state.before.bond.material.release.includes("peel") ? [peel(state)] : []),
  ];
}

function mounting(state: StepState): Finding[] {
  if (state.before.bond) return [finding(state, "clear", `On ${state.after.mount} before it leaves its carrier.`)];
  if (state.before.mount === "grinding tape")
    return [finding(state, "clear", "From grinding tape to frame in line: it is never free between the two.")];
  return [];
}

function leavesCarrier(context: RuleContext, state: StepState): Finding {
  const required = requiredAt(context, state);
  const least = thinnest(state);
  const at = formatQuantity(least, "length", { unit: "µm" });
  const figures: Finding["figures"] = [{ label: "Silicon, nominal minus tolerance", value: least, unit: "m" }];
  const { mount } = state.before;
  if (mount === "film frame" || mount === "edge ring")
    return { ...finding(state, "clear", `On ${mount} before it leaves its carrier.`), figures };
  if (required && supportRank(required.support) < supportRank("tape or ring"))
    return { ...finding(state, "clear", `At ${at} it may leave its carrier without tape.`), figures };
  return {
    ...finding(
      state,
      "do not run",
      `It would leave its carrier free at ${at}: it is not on tape or ring before this step.`,
      "Mount it on a film frame before the debond.",
    ),
    figures,
  };
}

function heatOnTape({ limits }: RuleContext, state: StepState): Finding {
  const limit = limits.tapeTemperature;
  const peak = state.step.peakTemperature;
  const outcome = againstUpperLimit(peak, limit.value, 0, "do not run");
  return {
    ...finding(
      state,
      outcome,
      `The debond reaches ${celsius(peak)}; the film frame under the wafer takes ${celsius(limit.value)}.`,
      outcome === "clear" ? null : "Choose a bonding material that lets go without heat, or a frame without tape.",
    ),
    figures: [{ label: "Peak temperature", value: peak, unit: "K", temperaturePoint: true }],
    limit: {
      label: LIMIT_DEFINITIONS.tapeTemperature.title,
      value: limit.value,
      unit: "K",
      temperaturePoint: true,
      source: limit.source,
    },
  };
}

/** Neither a peel force nor what bumps stand is an input yet, so a peel is never passed in silence. */
function peel(state: StepState): Finding {
  return finding(
    state,
    "caution",
    "It is peeled off: neither the peel force nor what the bumps stand is known here.",
    "Check the peel force against the bumps and the bend at the peel front.",
  );
}

/** A remover can dissolve the tape that carries the wafer; what the tape stands is not an input yet. */
function remover({ steps }: RuleContext, state: StepState): Finding[] {
  const debonded = steps.slice(0, state.number - 1).some(({ step }) => step.kind === "debond");
  if (!debonded || state.after.mount !== "film frame" || !state.step.exposures.includes("solvent")) return [];
  return [
    finding(
      state,
      "caution",
      "The remover reaches the dicing tape, and what that tape stands is not known here.",
      "Check the remover against the tape's own data.",
    ),
  ];
}

export const debondRule: Rule = {
  number: 8,
  title: TITLE,
  asks: "Is a thin wafer on tape or ring before it leaves its carrier, never free between tape and frame, and does the tape stand the debond's heat and the remover?",
  limits: ["tapeTemperature"],
  judge,
};
