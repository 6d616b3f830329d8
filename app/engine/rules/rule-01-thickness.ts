import { provenance } from "../measured.ts";
import { supportClassOf, supportRank, type Outcome } from "../vocabulary.ts";
import { formatQuantity } from "../units/format.ts";
import type { StepState } from "../flow/walk.ts";
import { againstLowerLimit, reaches } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { LIMIT_DEFINITIONS, type LimitKey } from "./limits.ts";
import { requiredSupport, type RequiredSupport } from "./required-support.ts";

const TITLE = "Thickness and support";

/** Silicon at its thinnest, m: nominal minus tolerance. */
export function thinnest(state: StepState): number {
  const { value, tolerance } = state.after.silicon;
  return value - (tolerance ?? 0);
}

/** What rule 1 requires at a step, at nominal minus tolerance; null for a diameter that it does not know. */
export function requiredAt(
  { flow, limits }: Pick<RuleContext, "flow" | "limits">,
  state: StepState,
): RequiredSupport | null {
  return requiredSupport(thinnest(state), flow.wafer.diameter, state.step, state.before.mount, limits);
}

const um = (value: number) => formatQuantity(value, "length", { unit: "µm" });

type MakeFinding = (outcome: Outcome, reason: string, remedy: string | null, limit: LimitKey | null) => Finding;

function judge(context: RuleContext, state: StepState): Finding[] {
  const { flow, limits } = context;
  const { tolerance, value } = state.after.silicon;
  const least = thinnest(state);
  const make: MakeFinding = (outcome, reason, remedy, limit) => ({
    rule: 1,
    title: TITLE,
    step: state.number,
    outcome,
    reason,
    figures: [
      { label: "Silicon, nominal", value, unit: "m" },
      { label: "Silicon, nominal minus tolerance", value: least, unit: "m" },
    ],
    limit: limit && {
      label: LIMIT_DEFINITIONS[limit].title,
      value: limits[limit].value,
      unit: "m",
      source: limits[limit].source,
    },
    remedy,
  });
  if (least <= 0)
    return [make("do not run", "The tolerance is as large as the silicon itself.", "Give a smaller tolerance.", null)];
  const required = requiredAt(context, state);
  if (!required) {
    const size = formatQuantity(flow.wafer.diameter, "length", { unit: "mm" });
    return [
      make("cannot judge", `No thickness limits are set for a ${size} wafer.`, "Use a wafer of 300 mm or less.", null),
    ];
  }
  const findings = [againstRequired(context, state, required, make)];
  if (setsThickness(state) && tolerance === null)
    findings.push(
      make(
        "caution",
        "The silicon thickness has no tolerance, so it is judged at nominal.",
        "Give the tolerance of the grind or polish.",
        null,
      ),
    );
  return findings;
}

function againstRequired(
  context: RuleContext,
  state: StepState,
  required: RequiredSupport,
  make: MakeFinding,
): Finding {
  const { planned, equipment } = state.step;
  const least = thinnest(state);
  if (supportRank(supportClassOf(planned)) < supportRank(required.support))
    return make(
      "needs support",
      `Needs ${required.support}, planned ${planned}: at ${um(least)} ${required.because}.`,
      `Plan ${required.support} for this step, or leave more silicon.`,
      required.limit,
    );
  const tool = equipment?.leastUnsupportedThickness ?? null;
  const onTool = tool && planned === "bare" ? againstLowerLimit(least, tool.value, 0, "needs support") : "clear";
  if (equipment && tool && onTool !== "clear")
    return {
      ...make(
        onTool,
        `${equipment.name} takes unsupported silicon from ${um(tool.value)}; here it is ${um(least)}.`,
        "Plan support for this step, or use a tool that takes thinner silicon.",
        null,
      ),
      limit: {
        label: "Least unsupported thickness of the tool",
        value: tool.value,
        unit: "m",
        source: provenance(tool),
      },
    };
  return meets(context, state, required, make);
}

/** Whether this step is the one that makes the silicon what it is. */
function setsThickness(state: StepState): boolean {
  return state.number === 1 || state.step.siliconAfter !== null;
}

/** The planned support meets the need: clear, unless it does so without any reserve. */
function meets(context: RuleContext, state: StepState, required: RequiredSupport, make: MakeFinding): Finding {
  const { flow, limits } = context;
  const { planned } = state.step;
  const { value } = state.after.silicon;
  const least = thinnest(state);
  const nominal = requiredSupport(value, flow.wafer.diameter, state.step, state.before.mount, limits);
  if (setsThickness(state) && nominal && nominal.support !== required.support)
    return make(
      "caution",
      `Nominal ${um(value)} would do with ${nominal.support}, but the tolerance reaches ${um(least)}: ${required.support} required, ${planned} planned.`,
      "Hold the thickness more closely, or keep the stronger support.",
      required.limit,
    );
  if (planned === "thin-wafer gripper" && required.support === "thin-wafer gripper")
    return make(
      "caution",
      `On a thin-wafer gripper at ${um(least)}: only while on that tool.`,
      "Plan tape or ring.",
      required.limit,
    );
  const noReserve = supportClassOf(planned) === required.support && required.floor;
  if (required.floor === "edgeRingLeast" && !reaches(least, limits.edgeRingFrom.value))
    return make(
      "caution",
      `On an edge ring at ${um(least)}, below ${um(limits.edgeRingFrom.value)}.`,
      "Plan a carrier.",
      "edgeRingFrom",
    );
  if (noReserve && againstLowerLimit(least, limits[noReserve].value, 0, "do not run") === "caution")
    return make(
      "caution",
      `${um(least)} is exactly the least that ${required.support} will do for.`,
      "Leave more silicon, or plan stronger support.",
      noReserve,
    );
  const need = required.support === "bare" ? "No support needed" : `Needs ${required.support}, ${planned} planned`;
  return make("clear", `${need}: ${um(least)} at its thinnest, ${required.because}.`, null, required.limit);
}

export const thicknessRule: Rule = {
  number: 1,
  title: TITLE,
  judge,
};

export const aboutThickness: RuleAbout = {
  asks: "Is the wafer held by enough at this step, for its diameter, its thickness at nominal minus tolerance, and what the step does to it?",
  limits: [
    "bareFrom150",
    "bareFrom200",
    "bareFrom300",
    "gripperFrom150",
    "gripperFrom200",
    "gripperFrom300",
    "carrierBelow",
    "tapeInLineFrom",
    "processCarrierBelow",
    "edgeRingFrom",
    "edgeRingLeast",
    "tapeTemperature",
  ],
};
