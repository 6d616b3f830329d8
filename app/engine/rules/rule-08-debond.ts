import type { StepState } from "../flow/walk.ts";
import { formatQuantity } from "../units/format.ts";
import { supportRank } from "../vocabulary.ts";
import type { Finding, Rule, RuleContext } from "./finding.ts";
import { requiredAt, thinnest } from "./rule-01-thickness.ts";

const TITLE = "Debond on tape or ring";

/** A wafer that leaves its carrier thin must already be on tape or ring; from tape to frame it goes in line. */
function judge(context: RuleContext, state: StepState): Finding[] {
  if (state.step.kind === "mount on frame" && state.before.mount === "grinding tape") return [inLine(state)];
  if (state.step.kind !== "debond" || !state.before.bond) return [];
  const required = requiredAt(context, state);
  const least = thinnest(state);
  const figures: Finding["figures"] = [{ label: "Silicon, nominal minus tolerance", value: least, unit: "m" }];
  const base = { rule: 8, title: TITLE, step: state.number, figures, limit: null };
  const at = formatQuantity(least, "length", { unit: "µm" });
  if (required && supportRank(required.support) < supportRank("tape or ring"))
    return [{ ...base, outcome: "clear", reason: `At ${at} it may leave its carrier without tape.`, remedy: null }];
  const mounted = state.before.mount === "film frame" || state.before.mount === "edge ring";
  if (mounted)
    return [
      { ...base, outcome: "clear", reason: `On ${state.before.mount} before it leaves its carrier.`, remedy: null },
    ];
  return [
    {
      ...base,
      outcome: "do not run",
      reason: `It would leave its carrier free at ${at}: it is not on tape or ring before this step.`,
      remedy: "Mount it on a film frame before the debond.",
    },
  ];
}

function inLine(state: StepState): Finding {
  return {
    rule: 8,
    title: TITLE,
    step: state.number,
    outcome: "clear",
    reason: "From grinding tape to frame in line: it is never free between the two.",
    figures: [],
    limit: null,
    remedy: null,
  };
}

export const debondRule: Rule = {
  number: 8,
  title: TITLE,
  asks: "Is a thin wafer on tape or ring before it leaves its carrier, and never free between tape and frame?",
  limits: [],
  judge,
};
