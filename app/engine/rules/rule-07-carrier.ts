import { edgesUp, type LyingShape } from "../flow/shape.ts";
import type { BondState } from "../flow/bond.ts";
import type { CarrierInput } from "../flow/model.ts";
import { bondLetGo } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { standardBow } from "../stoney/bow.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import { bondMade, bondsAsked } from "./bonded.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit, statedLimit, temperatureFigure } from "./make-finding.ts";
import { earlierSteps } from "./other-steps.ts";
import { releasePath } from "./release-path.ts";
import { thinnest } from "./rule-01-thickness.ts";
import { celsius, micrometres, millimetres, wholeMicrometres } from "./words.ts";

const TITLE = "Carrier";
const make = findingsOf(7, TITLE);

/** The pair as it comes out of the bond against the bonder: a match is judged by this bow, never by expansions alone. */
function pairBow(context: RuleContext, state: StepState, shape: LyingShape, { carrier }: BondState): Finding[] {
  const { limits, workings } = context;
  const tool = state.step.equipment;
  const up = edgesUp(shape, state.after.faceUp);
  const direction = up ? "edges up" : "edges down";
  const limit = up ? tool?.warpLimitEdgesUp : tool?.warpLimitEdgesDown;
  const figures: Finding["figures"] = [
    { label: "Warp of the pair", value: shape.warp, unit: "m", working: workings?.warp(shape) ?? null },
    { label: "Bow, device side up", value: standardBow(shape.sagitta), unit: "m" },
  ];
  const how = exceeds(shape.warp, limits.flatWithin.value) ? direction : "flat,";
  const lies = `${where(state, carrier)} lies ${how} ${wholeMicrometres(shape.warp)} at 25\u00a0°C`;
  // Without a tool or its limit the warp rule says what is missing.
  if (!tool || !limit) return [];
  const outcome = againstUpperLimit(shape.warp, limit.value, limit.value * limits.warpMargin.value, "do not run");
  return [
    make(state, outcome, `${lies}; ${tool.name} takes ${wholeMicrometres(limit.value)}.`, {
      remedy:
        "Choose a carrier whose expansion over this bond gives less bow, a lower bonding temperature, or a stiffer carrier.",
      figures,
      limit: statedLimit(`${tool.name}, ${direction}`, limit, "m"),
    }),
  ];
}

/** 'On Glass the pair', 'Between Glass and Silicon it'. */
function where({ after: { bonds } }: StepState, made: CarrierInput): string {
  const other = bonds.find(({ carrier }) => carrier !== made);
  return bonds.length > 1 ? `Between ${(other?.carrier ?? made).name} and ${made.name} it` : `On ${made.name} the pair`;
}

/** A carrier smaller than the wafer holds it only when the trim takes off what hangs over. */
function diameter({ flow }: RuleContext, state: StepState, { carrier }: BondState): Finding[] {
  if (!exceeds(flow.wafer.diameter, carrier.diameter)) return [];
  const { trim } = state.before;
  if (!trim || exceeds(flow.wafer.diameter - 2 * trim.width.value, carrier.diameter)) return [];
  return [
    make(
      state,
      "caution",
      `${carrier.name} measures ${millimetres(carrier.diameter)}: the trimmed face of the wafer rests on it, its rim of ${millimetres(trim.width.value)} hangs over until it is ground away.`,
      { remedy: "Choose a carrier at least as large as the wafer." },
    ),
  ];
}

/** How often a piece has been bonded earlier in the flow: its record does not know of that yet. */
function bondedEarlier({ steps }: RuleContext, state: StepState, { id, identity }: BondState["carrier"]): number {
  if (!identity) return 0;
  return earlierSteps(steps, state).filter(
    ({ step: { bond } }) => bond?.carrier.id === id && bond.carrier.identity === identity,
  ).length;
}

/** A piece that is named is told by its mark; what is said of it holds for the next time that it is bonded. */
function reuse(context: RuleContext, state: StepState, { carrier }: BondState): Finding[] {
  const { uses, useLimit, identity, outOfUse } = carrier;
  if (outOfUse)
    return [
      make(state, "do not run", `${carrier.name}${identity ? `, ${identity}` : ""}, is out of use: ${outOfUse}.`, {
        remedy: "Take another piece of this carrier.",
      }),
    ];
  if (typeof uses !== "number" || typeof useLimit !== "number") return [];
  const use = uses + bondedEarlier(context, state, carrier) + 1;
  const outcome = againstUpperLimit(use, useLimit, 0, "do not run");
  return [
    make(state, outcome, `Use ${use} of ${carrier.name}${identity ? `, ${identity}` : ""}; it stands ${useLimit}.`, {
      remedy: "Take a carrier with fewer uses.",
      figures: [{ label: "Use", value: use, unit: "1" }],
      limit: { label: `${carrier.name}, uses`, value: useLimit, unit: "1", source: "the site's carrier record" },
    }),
  ];
}

function heat(state: StepState, { carrier }: BondState): Finding[] {
  const peak = state.step.peakTemperature;
  const outcome = againstUpperLimit(peak, carrier.temperatureLimit.value, 0, "do not run");
  if (outcome === "clear") return [];
  return [
    make(state, outcome, `${celsius(peak)}; ${carrier.name} takes ${celsius(carrier.temperatureLimit.value)}.`, {
      remedy: "Lower the peak, or choose a carrier that takes more.",
      figures: [temperatureFigure("Peak temperature", peak)],
      limit: statedLimit(`${carrier.name}, temperature limit`, carrier.temperatureLimit, "K", true),
    }),
  ];
}

/** An electrostatic clamp holds what conducts: glass needs a coating. It also cools glass badly. */
function clamping(state: StepState, { carrier }: BondState): Finding[] {
  if (state.step.equipment?.clamping !== "electrostatic" || carrier.material !== "glass") return [];
  const warm = state.step.exposures.includes("plasma")
    ? " Glass also cools badly on it: the wafer runs hotter than on silicon."
    : "";
  const remedy = `Coat ${carrier.name} with a conductive layer, or use a clamp ring.`;
  if (carrier.conductiveCoating === true)
    return [make(state, "clear", `The coating of ${carrier.name} lets the electrostatic chuck hold it.${warm}`)];
  if (carrier.conductiveCoating === false)
    return [
      make(state, "do not run", `An electrostatic chuck does not hold ${carrier.name}: it has no conductive coating.`, {
        remedy,
      }),
    ];
  return [
    make(
      state,
      "caution",
      `An electrostatic chuck holds glass only with a conductive coating; whether ${carrier.name} has one is not given.${warm}`,
      { remedy: `Say whether ${carrier.name} has a conductive coating; without one use a clamp ring.` },
    ),
  ];
}

function sensing(state: StepState, { carrier }: BondState): Finding[] {
  const tool = state.step.equipment;
  if (!tool?.sensesOptically || carrier.material !== "glass" || carrier.seenBySensors === true) return [];
  const known = carrier.seenBySensors === false;
  return [
    make(
      state,
      known ? "do not run" : "caution",
      known
        ? `${tool.name} finds the wafer by light and does not see ${carrier.name}.`
        : `${tool.name} finds the wafer by light; whether it sees ${carrier.name} is not given.`,
      { remedy: "Use carriers with a frosted or coated rim, or a tool with other sensors." },
    ),
  ];
}

const POLISHES = ["polish", "stress relief", "grind"];

function printThrough({ limits }: RuleContext, state: StepState, { carrier }: BondState): Finding[] {
  if (carrier.perforated !== true || !POLISHES.includes(state.step.kind)) return [];
  const least = thinnest(state);
  if (exceeds(least, limits.printThroughBelow.value)) return [];
  return [
    make(
      state,
      "caution",
      `At ${micrometres(least)} the openings of ${carrier.name} print through into the polished face.`,
      {
        remedy: "Use a carrier without openings, or leave more silicon.",
        figures: [{ label: "Silicon, nominal minus tolerance", value: least, unit: "m" }],
        limit: siteLimit(limits, "printThroughBelow"),
      },
    ),
  ];
}

function judge(context: RuleContext, state: StepState): Finding[] {
  const { step, before } = state;
  const made = bondMade(state);
  const all = made ? [...before.bonds, made] : before.bonds;
  const bonds = bondsAsked(context, state, all);
  // What holds it from below is what was bonded last.
  const below = all.slice(-1).filter((bond) => bonds.includes(bond));
  const atBond =
    made && bonds.includes(made)
      ? [
          ...(state.atRoom ? pairBow(context, state, state.atRoom, made) : []),
          ...diameter(context, state, made),
          ...reuse(context, state, made),
        ]
      : [];
  const released = bondLetGo(before, step);
  return [
    ...atBond,
    ...bonds.flatMap((bond) => heat(state, bond)),
    ...below.flatMap((bond) => clamping(state, bond)),
    ...bonds.flatMap((bond) => sensing(state, bond)),
    ...bonds.flatMap((bond) => printThrough(context, state, bond)),
    ...(released && bonds.includes(released) ? releasePath(state, released) : []),
  ];
}

export const carrierRule: Rule = {
  number: 7,
  title: TITLE,
  judge,
};

export const aboutCarrier: RuleAbout = {
  asks: "Does the carrier match by the computed bow of the pair; does the light or solvent that lets it go pass it; does it fit the trimmed wafer, take the heat, hold and show on the tool, and have uses left?",
  limits: ["warpMargin", "flatWithin", "printThroughBelow"],
};
