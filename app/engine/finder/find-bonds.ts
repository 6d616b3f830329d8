import { EngineInputError } from "../errors.ts";
import type { FlowInput } from "../flow/model.ts";
import type { StepState } from "../flow/walk.ts";
import type { Finding, RuleContext } from "../rules/finding.ts";
import { judgeStep } from "../rules/judge-step.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { RULES } from "../rules/rules.ts";
import type { Catalogue, CatalogueMaterial } from "../trial/catalogue.ts";
import { blocks, relativeMargin } from "../trial/margin.ts";
import { trialContext, walked, walkOn, type WalkedFlow } from "../trial/trial-walk.ts";
import { outcomeRank, type Outcome } from "../vocabulary.ts";
import { bondSpans, type BondSpan } from "./bond-spans.ts";
import { isPlanned, withBond, type BondChoice } from "./with-bond.ts";

/** Rules whose outcome can hang on the carrier and what bonds it; the others are the same with every choice. */
const BOND_RULES = RULES.filter(({ number }) => [2, 3, 4, 5, 6, 7, 8, 9, 12, 14, 17, 18].includes(number));

/** Largest warp wanted at 25 °C after a step (number from 1), m. */
export interface WarpTarget {
  step: number;
  warp: number;
}

/** Why a choice does not fit: the first finding that bars it, or the target that it misses, or why nothing can be computed. */
export interface Misfit {
  step: number;
  /** null for a missed target and for what cannot be computed */
  finding: Finding | null;
  reason: string;
}

/** What trying one choice came to. */
export interface TriedBond extends BondChoice {
  /** whether it is what the flow plans */
  planned: boolean;
  /** worst outcome of the rules that the choice can change, up to the first that bars it */
  outcome: Outcome;
  /** smallest share of a limit that is left, and where; null while nothing that was judged has a limit */
  margin: { value: number; finding: Finding } | null;
  misfit: Misfit | null;
  /** warp at the target's step, m, when it was reached and the wafer is free there */
  atTarget: number | null;
}

export interface BondSearch {
  span: BondSpan;
  /** what fits first, by margin; then the others, those that get farthest first */
  tried: TriedBond[];
  /** how many steps were walked in all */
  stepsWalked: number;
}

/**
 * Tries every carrier with every bonding material at a few thicknesses in the place of one bond of a flow. Steps before the bond are
 * walked once; a choice is walked from its bond on, until the first step that bars it. Deterministic; nominal values.
 * @param bond which of the flow's bonds, from 0
 * @throws EngineInputError when the flow has no such bond, the target no such step, or the flow itself cannot be walked
 */
export function findBonds(
  flow: FlowInput,
  limits: SiteLimits,
  catalogue: Pick<Catalogue, "carriers" | "materials">,
  { bond = 0, target = null }: { bond?: number; target?: WarpTarget | null } = {},
): BondSearch {
  const span = bondSpans(flow)[bond];
  if (!span) throw new EngineInputError("bond", "the flow has no such bond", `0 to ${bondSpans(flow).length - 1}`);
  if (target && (!flow.steps[target.step - 1] || !(target.warp > 0)))
    throw new EngineInputError(
      "target",
      "names no step of the flow, or no warp above zero",
      `1 to ${flow.steps.length}`,
    );
  const base = walked(flow, limits);
  let stepsWalked = base.steps.length;
  const count = () => {
    stepsWalked += 1;
  };
  const tried = catalogue.carriers.flatMap((carrier) =>
    catalogue.materials.flatMap((entry) =>
      thicknessesOf(flow, span, entry).map((thickness) =>
        tryBond(base, limits, { span, choice: { carrier, material: entry.material, thickness }, target, count }),
      ),
    ),
  );
  return { span, tried: tried.sort(byFit), stepsWalked };
}

/** The least, the middle and the most that a material is put on in, and what the flow plans of it. */
export function thicknessesOf(
  flow: FlowInput,
  { from }: BondSpan,
  { material, leastThickness, mostThickness }: CatalogueMaterial,
): number[] {
  const middle = Number(((leastThickness + mostThickness) / 2).toPrecision(12));
  const planned = flow.steps[from - 1]?.bond;
  const own = planned?.material.id === material.id ? [planned.thickness.value] : [];
  // The planned value goes first: one that differs from it in the last digit only is the same bond.
  const alike = (a: number, b: number) => Math.abs(a - b) < 1e-9;
  return [...own, leastThickness, middle, mostThickness]
    .filter((value, index, all) => all.findIndex((other) => alike(other, value)) === index)
    .sort((a, b) => a - b);
}

interface Trial {
  span: BondSpan;
  choice: BondChoice;
  target: WarpTarget | null;
  count: () => void;
}

function tryBond(base: WalkedFlow, limits: SiteLimits, { span, choice, target, count }: Trial): TriedBond {
  const planned = isPlanned(base.flow, span, choice);
  const flow = withBond(base.flow, span, choice);
  const found: TriedBond = { ...choice, planned, outcome: "clear", margin: null, misfit: null, atTarget: null };
  // Rules look ahead at what later steps do, never at how the wafer is there: those stand in from the base until they are walked.
  const steps = base.steps.map((state, index) => ({ ...state, step: flow.steps[index] ?? state.step }));
  const context = { ...trialContext({ flow, steps }, limits), tried: span };
  try {
    const states = planned ? base.steps.slice(span.from - 1) : walkOn(base, flow, limits);
    for (const state of states) {
      if (!planned) count();
      steps[state.number - 1] = state;
      if (judgeTried(found, context, state, target)) break;
    }
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    const step = Number(/^steps\[(\d+)\]/.exec(error.field)?.[1] ?? span.from - 1) + 1;
    found.misfit = { step, finding: null, reason: `It cannot be computed: ${error.reason}.` };
    found.outcome = "cannot judge";
  }
  return found;
}

/** Takes one step into account; true when it bars the choice. */
function judgeTried(found: TriedBond, context: RuleContext, state: StepState, target: WarpTarget | null): boolean {
  // Rule by rule: the first that bars the choice spares the others.
  for (const rule of BOND_RULES)
    for (const finding of judgeStep(context, state, [rule])) {
      if (outcomeRank(finding.outcome) > outcomeRank(found.outcome)) found.outcome = finding.outcome;
      const value = relativeMargin(finding);
      if (value !== null && (!found.margin || value < found.margin.value)) found.margin = { value, finding };
      if (blocks(finding.outcome)) {
        found.misfit = { step: state.number, finding, reason: finding.reason };
        return true;
      }
    }
  if (target?.step !== state.number || !state.atRoom) return false;
  found.atTarget = state.atRoom.warp;
  if (!(found.atTarget > target.warp)) return false;
  found.misfit = { step: state.number, finding: null, reason: "It warps more than the target." };
  return true;
}

function byFit(a: TriedBond, b: TriedBond): number {
  if (!a.misfit && !b.misfit) return (b.margin?.value ?? 0) - (a.margin?.value ?? 0);
  if (!a.misfit || !b.misfit) return a.misfit ? 1 : -1;
  return b.misfit.step - a.misfit.step || (b.margin?.value ?? 0) - (a.margin?.value ?? 0);
}
