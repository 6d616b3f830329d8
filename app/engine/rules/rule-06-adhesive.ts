import { provenance } from "../measured.ts";
import { flowPoint, glassTransition, type BondState } from "../flow/bond.ts";
import { timeAbove } from "../flow/temperature-profile.ts";
import type { StepState } from "../flow/walk.ts";
import { formatQuantity } from "../units/format.ts";
import type { Outcome } from "../vocabulary.ts";
import { bondBudget } from "./bond-budget.ts";
import { bondChemistry } from "./bond-chemistry.ts";
import { bondThickness } from "./bond-thickness.ts";
import { bondsAsked, bondsStaying } from "./bonded.ts";
import { againstUpperLimit, exceeds, reaches } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { celsius, duration } from "./words.ts";

const TITLE = "Bonding material";

/** The bonds that the step acts on: those that it comes with, not the one that it makes or lets go. */
function judge(context: RuleContext, state: StepState): Finding[] {
  const staying = bondsAsked(context, state, bondsStaying(state));
  return [...bondThickness(state), ...staying.flatMap((bond) => judgeBond(context, state, bond))];
}

function judgeBond(context: RuleContext, state: StepState, bond: BondState): Finding[] {
  const { limits } = context;
  const { material } = bond;
  const peak = state.step.peakTemperature;
  const margin = limits.adhesiveMargin.value;
  const figures: Finding["figures"] = [
    { label: "Peak temperature", value: peak, unit: "K", temperaturePoint: true },
    { label: "Margin asked below the limit", value: margin, unit: "K" },
  ];
  const softensAt = flowPoint(material) ?? glassTransition(material);
  if (softensAt !== null)
    figures.push({ label: softeningWord(material), value: softensAt, unit: "K", temperaturePoint: true });
  const make = (outcome: Outcome, reason: string, remedy: string | null): Finding => ({
    rule: 6,
    title: TITLE,
    step: state.number,
    outcome,
    reason,
    figures,
    limit: {
      label: `${material.name}, temperature limit`,
      value: material.temperatureLimit.value,
      unit: "K",
      temperaturePoint: true,
      source: provenance(material.temperatureLimit),
    },
    remedy,
  });
  const findings = [againstTemperatureLimit(peak, material.name, material.temperatureLimit.value, margin, make)];
  if (softensAt !== null && reaches(peak, softensAt)) findings.push(aboveSoftening(state, material, softensAt, make));
  const tooLong = beyondHoldTime(state, material, margin, make);
  if (tooLong) findings.push(tooLong);
  return [...findings, ...bondChemistry(context, state, bond), ...bondBudget(context, state, bond)];
}

/** A temperature limit holds for a time: near it, a longer hold is more than was tried. */
function beyondHoldTime(
  { step }: StepState,
  { name, temperatureLimit, limitTime }: BondMaterial,
  margin: number,
  make: MakeFinding,
): Finding | null {
  const from = temperatureLimit.value - margin;
  if (!limitTime || !reaches(step.peakTemperature, from)) return null;
  const time = timeAbove(step, from);
  if (time === null || !exceeds(time, limitTime.value)) return null;
  return make(
    "do not run",
    `${duration(time)} near its limit; ${name} stands that for ${duration(limitTime.value)}.`,
    "Shorten the hold, lower the peak, or bond with a material that takes more.",
  );
}

type BondMaterial = BondState["material"];
type MakeFinding = (outcome: Outcome, reason: string, remedy: string | null) => Finding;

function againstTemperatureLimit(
  peak: number,
  name: string,
  limit: number,
  margin: number,
  make: MakeFinding,
): Finding {
  const outcome = againstUpperLimit(peak, limit, margin, "do not run");
  const figures = `${celsius(peak)} against the ${celsius(limit)} that ${name} takes`;
  if (outcome === "clear") return make("clear", `${figures}.`, null);
  const remedy = `Lower the peak to less than ${celsius(limit - margin)}, or bond with a material that takes more.`;
  if (outcome === "caution")
    return make(
      "caution",
      `${figures}: within its margin of ${formatQuantity(margin, "temperatureDifference", { unit: "K" })}.`,
      remedy,
    );
  return make("do not run", `${figures}.`, remedy);
}

/** What the temperature from which a material is soft is called: a stated flow point comes before the softening point. */
const softeningWord = (material: BondMaterial) => (flowPoint(material) === null ? "Softening point" : "Flow point");

function aboveSoftening(state: StepState, material: BondMaterial, softensAt: number, make: MakeFinding): Finding {
  const point = softeningWord(material).toLowerCase();
  const above = `${celsius(state.step.peakTemperature)} reaches the ${point} of ${material.name}, ${celsius(softensAt)}`;
  if (!material.flows) return make("clear", `${above}: it is cross-linked, stays coupled and does not flow.`, null);
  if (state.step.exposures.includes("vacuum"))
    return make(
      "do not run",
      `${above}: it flows, and in vacuum the thin wafer blisters or floats.`,
      "Keep vacuum steps below that point, or bond with a cross-linked material.",
    );
  return make(
    "caution",
    `${above}: it flows, and the pair can slide until it cools.`,
    "Keep the step below that point, or bond with a cross-linked material.",
  );
}

export const adhesiveRule: Rule = {
  number: 6,
  title: TITLE,
  judge,
};

export const aboutAdhesive: RuleAbout = {
  asks: "Is each bond as thick as its material is made for? Does each bonding material that is there stay below its temperature limit with its margin and hold time, and below the point where it flows; does it stand the vacuum, chemicals and light of every step between its bond and its debond, and all their heat together?",
  limits: ["adhesiveMargin", "weightLossClear", "weightLoss", "heatingFrom"],
};
