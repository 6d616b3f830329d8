import { bondOn } from "../flow/bond.ts";
import { bondLetGo } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf } from "./make-finding.ts";
import { hasBumps } from "./solder.ts";

const TITLE = "Contact and charge";
const make = findingsOf(18, TITLE);

/** Whether adhesive or tape covers the device side while the step touches it. */
function deviceSideCovered({ after: { bonds, mountedSide } }: StepState): boolean {
  return bondOn(bonds, "front") !== null || mountedSide === "front";
}

function touched(context: RuleContext, state: StepState): Finding[] {
  const contact = state.step.contact ?? state.step.equipment?.contact ?? null;
  if (!contact || contact.face !== "front" || deviceSideCovered(state)) return [];
  const { means } = contact;
  if (means === "edge grip") return [make(state, "clear", "Gripped by its edge: nothing touches the device side.")];
  const remedy = "Grip it by its edge or from the back side, or cover the device side with tape.";
  if (hasBumps(context.steps, state))
    return [make(state, "do not run", `A ${means} touches the bumps on the device side.`, { remedy })];
  if (state.before.front.length === 0) return [];
  return [make(state, "caution", `A ${means} touches the films on the device side.`, { remedy })];
}

/** Peeling parts two insulators and charges both. */
function charged(state: StepState): Finding[] {
  const { step, before } = state;
  const peels =
    bondLetGo(before, step)?.material.release.includes("peel") === true ||
    (step.kind === "mount on frame" && before.mount === "grinding tape");
  if (!peels) return [];
  const tool = step.equipment;
  if (tool?.ioniser === false)
    return [
      make(state, "caution", `The peel charges the wafer, and ${tool.name} does not take the charge off.`, {
        remedy: "Use a tool with an ioniser at the peel.",
      }),
    ];
  return [
    make(
      state,
      "clear",
      tool?.ioniser === true
        ? `The ioniser of ${tool.name} takes the charge of the peel off.`
        : "The peel charges the wafer: ioniser on.",
    ),
  ];
}

export const contactRule: Rule = {
  number: 18,
  title: TITLE,
  judge: (context, state) => [...touched(context, state), ...charged(state)],
};

export const aboutContact: RuleAbout = {
  asks: "Which face is touched and with what: no pad on bumps or open films, and no charge left by a peel?",
  limits: [],
};
