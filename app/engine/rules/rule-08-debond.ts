import { bondedFace, type BondState } from "../flow/bond.ts";
import { bondLetGo } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { supportRank } from "../vocabulary.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import { bondLeft, isBonded } from "./bonded.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, statedLimit, temperatureFigure } from "./make-finding.ts";
import { staysOn } from "./other-carrier.ts";
import { earlierSteps } from "./other-steps.ts";
import { peel } from "./peel.ts";
import { againstExposures } from "./resistance.ts";
import { requiredAt, thinnest } from "./rule-01-thickness.ts";
import { firstToMelt, hasBumps } from "./solder.ts";
import { onTape, tapeHeatLimit, tapeName } from "./tape.ts";
import { celsius, kelvins, micrometres } from "./words.ts";

const TITLE = "Debond on tape or ring";
const make = findingsOf(8, TITLE);

/** A wafer that leaves its carrier thin must already be on tape or ring, and that must stand the debond and the clean after it. */
function judge(context: RuleContext, state: StepState): Finding[] {
  const { kind } = state.step;
  if (kind === "mount on frame") return mounting(context, state);
  if (kind === "clean") return remover(context, state);
  const released = bondLetGo(state.before, state.step);
  if (!released) return [];
  const { release } = released.material;
  const left = bondLeft(state);
  const bumped = bondedFace(released) === "front" && hasBumps(context.steps, state);
  return [
    ...(left ? staysOn(state, released, left) : [leavesCarrier(context, state)]),
    ...(onTape(state.before) ? [heatOnTape(context, state)] : []),
    ...heatOnSolder(context, state),
    ...(release.includes("peel") ? [peel(context, state, released.material, { bumped, left })] : []),
    ...(release === "thermal slide" && bumped ? [slide(state, released)] : []),
  ];
}

function mounting(context: RuleContext, state: StepState): Finding[] {
  if (isBonded(state.before)) return [make(state, "clear", `On ${state.after.mount} before it leaves its carrier.`)];
  if (state.before.mount !== "grinding tape") return [];
  if (state.step.inLine !== false)
    return [make(state, "clear", "From grinding tape to frame in line: it is never free between the two.")];
  const required = requiredAt(context, state);
  if (required && supportRank(required.support) < supportRank("tape or ring"))
    return [make(state, "clear", `At ${micrometres(thinnest(state))} it may stand free between tape and frame.`)];
  return [
    make(state, "do not run", "It would stand free between tape and frame: the transfer is not in line.", {
      remedy: "Mount it on the frame in line, before the grinding tape is peeled.",
    }),
  ];
}

function leavesCarrier(context: RuleContext, state: StepState): Finding {
  const required = requiredAt(context, state);
  const least = thinnest(state);
  const figures: Finding["figures"] = [{ label: "Silicon, nominal minus tolerance", value: least, unit: "m" }];
  const { mount } = state.before;
  if (mount === "film frame" || mount === "edge ring")
    return make(state, "clear", `On ${mount} before it leaves its carrier.`, { figures });
  if (required && supportRank(required.support) < supportRank("tape or ring"))
    return make(state, "clear", `At ${micrometres(least)} it may leave its carrier without tape.`, { figures });
  return make(
    state,
    "do not run",
    `It would leave its carrier free at ${micrometres(least)}: it is not on tape or ring before this step.`,
    { remedy: "Mount it on a film frame before the debond.", figures },
  );
}

function heatOnTape({ limits }: RuleContext, state: StepState): Finding {
  const limit = tapeHeatLimit(state.before, limits);
  const peak = state.step.peakTemperature;
  const outcome = againstUpperLimit(peak, limit.value, 0, "do not run");
  return make(
    state,
    outcome,
    `The debond reaches ${celsius(peak)}; ${tapeName(state.before)} under the wafer takes ${celsius(limit.value)}.`,
    {
      remedy: "Choose a bonding material that lets go without heat, or a frame without tape.",
      figures: [temperatureFigure("Peak temperature", peak)],
      limit,
    },
  );
}

/** A hot debond shears or peels: solder must be well below its melting. */
function heatOnSolder({ limits }: RuleContext, state: StepState): Finding[] {
  const peak = state.step.peakTemperature;
  const solder = firstToMelt(state.before);
  if (!solder || !exceeds(peak, ROOM_TEMPERATURE)) return [];
  const { film, melting } = solder;
  const margin = limits.solderMargin.value;
  const outcome = againstUpperLimit(peak, melting.value, margin, "do not run");
  const left = melting.value - peak;
  return [
    make(
      state,
      outcome,
      `${celsius(peak)} is ${kelvins(Math.abs(left))} ${left < 0 ? "above" : "below"} the melting of ${film.name}, ${celsius(melting.value)}; at least ${kelvins(margin)} below is asked.`,
      {
        remedy: `Debond below ${celsius(melting.value - margin)}, or before the solder is put on.`,
        figures: [temperatureFigure("Peak temperature", peak), { label: "Margin asked", value: margin, unit: "K" }],
        limit: statedLimit(`${film.name}, melting`, melting, "K", true),
      },
    ),
  ];
}

/** A slide drags what stands in the adhesive. */
function slide(state: StepState, { thickness }: BondState): Finding {
  const { bumps } = state.before;
  const embedded = bumps ? ` ${micrometres(Math.min(bumps.height.value, thickness.value))} deep` : "";
  return make(state, "caution", `The slide drags bumps that are embedded${embedded} in the bonding material.`, {
    remedy: "Choose a bonding material that lets go by light, solvent or peel.",
    figures: bumps ? [{ label: "Bump height", value: bumps.height.value, unit: "m" }] : [],
  });
}

/** A remover can dissolve the tape that carries the wafer. */
function remover({ steps }: RuleContext, state: StepState): Finding[] {
  const debonded = earlierSteps(steps, state).some(({ step }) => step.kind === "debond");
  if (!debonded || state.after.mount !== "film frame" || !state.step.exposures.includes("solvent")) return [];
  const found = againstExposures(state.step, state.after.tape?.resistances).find(
    ({ exposure }) => exposure === "solvent",
  );
  const outcome = found?.outcome ?? null;
  if (outcome === null)
    return [
      make(
        state,
        "caution",
        "The remover reaches the dicing tape; whether that tape stands it cannot be judged until it is given.",
        { remedy: "Give what the dicing tape does in solvent, and check the remover against the tape's own data." },
      ),
    ];
  const name = tapeName(state.after);
  return [
    make(state, outcome, `The remover reaches the dicing tape: ${name} ${found?.says ?? ""}.`, {
      remedy: "Choose another remover, a shorter clean, or a dicing tape that stands it.",
    }),
  ];
}

export const debondRule: Rule = {
  number: 8,
  title: TITLE,
  judge,
};

export const aboutDebond: RuleAbout = {
  asks: "Is a thin wafer on tape, ring or another carrier before it leaves its carrier, never free between tape and frame; do the tape and the solder stand the debond's heat, the tape the remover, and the bumps the peel or slide; does the bond that is to stay hold when the other is let go?",
  limits: ["tapeTemperature", "solderMargin", "warpMargin"],
};
