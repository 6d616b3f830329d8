import type { StepState } from "../flow/walk.ts";
import { bondedFace } from "../flow/bond.ts";
import { allFilms, bondLetGo } from "../flow/state.ts";
import { inSentence } from "../in-sentence.ts";
import { SIDE_NAMES } from "../vocabulary.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import { BOND_CHECKS, carriersOf, type Check } from "./bond-order.ts";
import { isBonded } from "./bonded.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { laterSteps } from "./other-steps.ts";
import { tapeHeatLimit } from "./tape.ts";
import { celsius, micrometres as um, millimetres as mm } from "./words.ts";

const TITLE = "Order of the steps";

const growsSilicon: Check = ({ step, before }) =>
  step.siliconAfter && exceeds(step.siliconAfter.value, before.silicon.value)
    ? {
        reason: `It should leave ${um(step.siliconAfter.value)} of silicon, but only ${um(before.silicon.value)} are there.`,
        remedy: "Give the silicon that remains after the step, at most what is there before it.",
      }
    : null;

const bondsToNothing: Check = ({ step }) =>
  step.kind === "bond" && !step.bond
    ? { reason: "No carrier and bonding material are chosen.", remedy: "Choose both at this step." }
    : null;

const plannedCarrierMissing: Check = ({ step, after }) =>
  step.planned === "carrier" && !isBonded(after)
    ? {
        reason: "A carrier is planned, but the wafer is not bonded to one here.",
        remedy: "Add the bond before this step, or plan another support.",
      }
    : null;

const leavesCarrierUnnoticed: Check = ({ step, after }) =>
  isBonded(after) && step.planned !== "carrier"
    ? {
        reason: `It is still bonded to ${carriersOf(after.bonds)}, but ${step.planned} is planned.`,
        remedy: "Plan the carrier here, or debond before this step.",
      }
    : null;

const plannedMountMissing: Check = ({ step, after }) =>
  (step.planned === "grinding tape" || step.planned === "film frame" || step.planned === "edge ring") &&
  after.mount !== step.planned &&
  !isBonded(after)
    ? {
        reason: `${step.planned === "edge ring" ? "An" : "A"} ${step.planned} is planned, but the wafer was not put on one.`,
        remedy: step.planned === "grinding tape" ? "Laminate the tape before this step." : "Mount it before this step.",
      }
    : null;

const dicesUnmounted: Check = ({ step, before }) =>
  step.kind === "dice" && before.mount !== "film frame" && before.mount !== "edge ring"
    ? {
        reason: "It would be diced without a frame: the dies would be loose.",
        remedy: "Mount it on a film frame before dicing.",
      }
    : null;

/** Work on a whole wafer. */
const WHOLE_WAFER = [
  "deposit",
  "cure",
  "anneal",
  "pattern",
  "plate",
  "reflow",
  "edge trim",
  "bond",
  "grind",
  "stress relief",
  "polish",
  "via reveal",
  "back-side film",
];

const worksAfterDicing: Check = ({ step, before }) =>
  before.diced && WHOLE_WAFER.includes(step.kind)
    ? { reason: "The wafer is already diced here.", remedy: "Move this step before dicing." }
    : null;

/** The heat of a debond is judged by the debond rule. An edge ring has no tape under the wafer. */
const heatsTape: Check = ({ step, after }, { limits }) => {
  const { mount, tape } = after;
  if (!mount || mount === "edge ring" || step.kind === "debond") return null;
  const limit = tapeHeatLimit(after, limits).value;
  const outcome = againstUpperLimit(step.peakTemperature, limit, 0, "do not run");
  const vacuum = (["vacuum", "plasma"] as const).some(
    (exposure) => step.exposures.includes(exposure) && tape?.resistances?.[exposure]?.word !== "resists",
  );
  if (outcome === "clear" && !vacuum) return null;
  const remedy = "Take the tape off before heat and vacuum, or plan a carrier for this step.";
  if (vacuum) return { reason: `It is on ${mount}, which does not go into vacuum or plasma.`, remedy };
  const reason = `It is on ${mount}, which takes ${celsius(limit)}; the step reaches ${celsius(step.peakTemperature)}.`;
  return { outcome, reason, remedy };
};

const trimsAfterGrinding: Check = ({ step, before }) =>
  step.kind === "edge trim" && before.ground
    ? {
        reason: "The edge is trimmed after grinding: the knife edge is already there.",
        remedy: "Trim the edge before the grind.",
      }
    : null;

const removesWhatIsNotThere: Check = ({ step, before }) => {
  const left = allFilms(before).map(({ addition }) => addition);
  const missing = step.removes.find(({ side, filmId }) => {
    const at = left.findIndex((addition) => addition.side === side && addition.film.id === filmId);
    if (at >= 0) left.splice(at, 1);
    return at < 0;
  });
  return missing
    ? {
        reason: `It removes ${missing.filmName} from the ${missing.side} side, where there is none.`,
        remedy: "Choose a film that is on that side at this step.",
      }
    : null;
};

const doesNotFitTool: Check = ({ step, after }, { flow }) => {
  if (!step.equipment) return null;
  const most = step.equipment.largestDiameter.value;
  const carrier = after.bonds.map((bond) => bond.carrier).find(({ diameter }) => exceeds(diameter, most));
  if (carrier)
    return {
      reason: `${carrier.name} measures ${mm(carrier.diameter)}; ${inSentence(step.equipment.name)} takes ${mm(most)}.`,
      remedy: "Choose a carrier or a tool of the same size.",
    };
  if (exceeds(flow.wafer.diameter, most))
    return {
      reason: `The wafer measures ${mm(flow.wafer.diameter)}; ${inSentence(step.equipment.name)} takes ${mm(most)}.`,
      remedy: "Choose a tool for this wafer size.",
    };
  return null;
};

/** What hangs over is allowed where the edge trim takes it off: the carrier rule says so. */
const carrierTooSmall: Check = ({ step, before }, { flow }) => {
  const held = flow.wafer.diameter - 2 * (before.trim?.width.value ?? 0);
  return step.kind === "bond" && step.bond && exceeds(held, step.bond.carrier.diameter)
    ? {
        reason: `${step.bond.carrier.name} measures ${mm(step.bond.carrier.diameter)}, less than the ${mm(flow.wafer.diameter)} wafer: the edge would hang free.`,
        remedy: "Choose a carrier at least as large as the wafer.",
      }
    : null;
};

const CHECKS: Check[] = [
  growsSilicon,
  bondsToNothing,
  ...BOND_CHECKS,
  carrierTooSmall,
  doesNotFitTool,
  plannedCarrierMissing,
  leavesCarrierUnnoticed,
  plannedMountMissing,
  trimsAfterGrinding,
  heatsTape,
  removesWhatIsNotThere,
  dicesUnmounted,
  worksAfterDicing,
];

/** After a debond the next wet step must take the adhesive off before anything else is done to that face. */
function cleanAfterDebond({ steps }: RuleContext, state: StepState): Finding | null {
  const released = bondLetGo(state.before, state.step);
  if (!released) return null;
  const later = laterSteps(steps, state);
  const next = later.find(({ step }) => !["move", "store", "hold", "measure"].includes(step.kind));
  if (next?.step.kind === "clean") return null;
  return finding(
    state,
    "caution",
    `No cleaning step follows the debond: the adhesive stays on the ${SIDE_NAMES[bondedFace(released)]}.`,
    "Add a clean after the debond.",
  );
}

function finding(state: StepState, outcome: Finding["outcome"], reason: string, remedy: string | null): Finding {
  return { rule: 12, title: TITLE, step: state.number, outcome, reason, figures: [], limit: null, remedy };
}

function judge(context: RuleContext, state: StepState): Finding[] {
  const faults = CHECKS.flatMap((check) => check(state, context) ?? []);
  const findings = faults.map(({ outcome = "do not run", reason, remedy }) => finding(state, outcome, reason, remedy));
  const clean = cleanAfterDebond(context, state);
  if (clean) findings.push(clean);
  if (findings.length === 0 && ["debond", "dice", "bond"].includes(state.step.kind))
    findings.push(finding(state, "clear", "In order: what it needs was done before.", null));
  return findings;
}

export const orderRule: Rule = {
  number: 12,
  title: TITLE,
  judge,
};

export const aboutOrder: RuleAbout = {
  asks: "Can the steps be done in this order: nothing below zero, nothing unmounted diced, debond of what is bonded and of the face that is said, nothing done under a carrier, clean after debond, tape off before heat or vacuum, trim before grind, a second carrier only on the other face, and does the wafer or its carrier fit the tool?",
  limits: ["tapeTemperature"],
};
