import { provenance } from "../measured.ts";
import { edgesUp, type LyingShape } from "../flow/shape.ts";
import { faceUpLoaded } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { standardBow } from "../stoney/bow.ts";
import { formatQuantity, formatWithUncertainty } from "../units/format.ts";
import { inSentence } from "../in-sentence.ts";
import type { FaceUp, Outcome } from "../vocabulary.ts";
import { FLAT_WITHIN_UNCERTAINTY, flatWithinUncertainty, outcomeRank } from "../vocabulary.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { previousStep } from "./other-steps.ts";
import { shareBeyond, sharedBy } from "./share-beyond.ts";

const TITLE = "Warp on the tool";

/** One moment at which the wafer lies on the tool with a shape of its own. */
interface Moment {
  when: "as it is loaded" | "as it leaves" | "free at peak";
  shape: LyingShape;
  faceUp: FaceUp;
  uncertainty: number | null;
}

/** As it comes to the tool, as it leaves, and at peak where the tool leaves it free. */
function moments({ steps, uncertainty }: RuleContext, state: StepState): Moment[] {
  const previous = previousStep(steps, state);
  const own = uncertainty[state.number - 1];
  const found: Moment[] = [];
  if (previous?.atRoom)
    found.push({
      when: "as it is loaded",
      shape: previous.atRoom,
      faceUp: faceUpLoaded(state.before, state.step),
      uncertainty: uncertainty[previous.number - 1]?.atRoom ?? null,
    });
  if (state.atRoom)
    found.push({
      when: "as it leaves",
      shape: state.atRoom,
      faceUp: state.after.faceUp,
      uncertainty: own?.atRoom ?? null,
    });
  if (state.atPeak && state.step.equipment?.atPeak === "free")
    found.push({
      when: "free at peak",
      shape: state.atPeak,
      faceUp: state.after.faceUp,
      uncertainty: own?.atPeak ?? null,
    });
  return found;
}

function judge(context: RuleContext, state: StepState): Finding[] {
  const { equipment } = state.step;
  const found = moments(context, state);
  if (found.length === 0) return [];
  if (!equipment)
    return [
      {
        rule: 2,
        title: TITLE,
        step: state.number,
        outcome: "cannot judge",
        reason: "No tool is named for this step, so its warp limit is not known.",
        figures: [],
        limit: null,
        remedy: "Choose the tool of this step.",
      },
    ];
  const judged = found.map((moment) => ({ ...judgeMoment(context, state, equipment, moment), shape: moment.shape }));
  // Several moments of one step are one finding: the worst, at equal outcome the one nearest its limit.
  judged.sort((a, b) => outcomeRank(b.outcome) - outcomeRank(a.outcome) || use(b) - use(a));
  return judged.slice(0, 1).map(({ shape, figures: [warp, ...figures], ...finding }) => ({
    ...finding,
    // A working costs as much as the shape itself, so only the finding that stays gets one.
    figures: warp ? [{ ...warp, working: context.workings?.warp(shape) ?? null }, ...figures] : [],
  }));
}

const use = (finding: Finding) => (finding.figures[0]?.value ?? 0) / (finding.limit?.value ?? Infinity);

/** How it lies, with its figure: 'edges up 231 ± 4 µm', 'flat, 8 µm'; rolled, it has a radius and an edge lift instead. */
function inWords({ shape, uncertainty }: Moment, direction: string, flatWithin: number): string {
  if (shape.regime === "curled" && shape.rollRadius !== null)
    return `rolls up, radius about ${formatQuantity(shape.rollRadius, "length", { unit: "m", significant: 2 })}, edges lift ${um(shape.warp)}`;
  const warp = uncertainty
    ? formatWithUncertainty(shape.warp, 2 * uncertainty, "length", { unit: "µm" })
    : um(shape.warp);
  if (!exceeds(shape.warp, flatWithin)) return `flat, ${warp}`;
  return flatWithinUncertainty(shape.warp, uncertainty)
    ? `${FLAT_WITHIN_UNCERTAINTY}, ${warp}`
    : `${direction} ${warp}`;
}

function judgeMoment(
  { limits, uncertainty: spread }: RuleContext,
  state: StepState,
  equipment: NonNullable<StepState["step"]["equipment"]>,
  moment: Moment,
): Finding {
  const { shape, faceUp, uncertainty } = moment;
  const up = edgesUp(shape, faceUp);
  const direction = up ? "edges up" : "edges down";
  const lies = capital(inWords(moment, direction, limits.flatWithin.value));
  const when =
    moment.when === "free at peak"
      ? `at ${formatQuantity(shape.temperature, "temperature", { unit: "°C" })}, free`
      : moment.when;
  const found = {
    rule: 2,
    title: TITLE,
    step: state.number,
    figures: [
      {
        label: `Warp, ${when}`,
        value: shape.warp,
        unit: "m" as const,
        standardUncertainty: uncertainty,
      },
      {
        label: "Bow, device side up",
        value: standardBow(shape.sagitta),
        unit: "m" as const,
        standardUncertainty: uncertainty,
      },
    ],
  };
  const limit = up ? equipment.warpLimitEdgesUp : equipment.warpLimitEdgesDown;
  if (!limit)
    return {
      ...found,
      outcome: "cannot judge",
      reason: `${lies} ${when}; ${inSentence(equipment.name)} has no warp limit for ${direction}.`,
      limit: null,
      remedy: `Give ${inSentence(equipment.name)} its limit, or choose another tool.`,
    };
  const margin = limit.value * limits.warpMargin.value;
  const outcome: Outcome = againstUpperLimit(shape.warp, limit.value, margin, "do not run");
  const share = shareBeyond(shape.warp, uncertainty, limit.value);
  const at = moment.when === "as it is loaded" ? state.number - 2 : state.number - 1;
  const by = share ? ` ${sharedBy(spread[at]?.budget ?? [])}` : "";
  return {
    ...found,
    outcome,
    reason: `${lies} ${when}; ${inSentence(equipment.name)} takes ${um(limit.value)} ${direction}.${share ? ` ${share}${by}` : ""}`,
    limit: { label: `${equipment.name}, ${direction}`, value: limit.value, unit: "m", source: provenance(limit) },
    remedy:
      outcome === "clear"
        ? null
        : shape.regime === "curled"
          ? "Hold it on tape, ring or carrier here, leave more silicon, or lower the film force: no tool takes a wafer that rolls up."
          : `Lower the film force or leave more silicon at this step, choose a carrier that bows less, or a tool that takes more than ${um(shape.warp)}.`,
  };
}

const um = (value: number) => formatQuantity(value, "length", { unit: "µm", decimals: 0 });
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

export const warpRule: Rule = {
  number: 2,
  title: TITLE,
  judge,
};

export const aboutWarp: RuleAbout = {
  asks: "Does the wafer or pair lie flat enough for the tool, as it is loaded, as it leaves, and at peak where the tool leaves it free, against the tool's limit for edges up and for edges down?",
  limits: ["warpMargin", "flatWithin"],
};
