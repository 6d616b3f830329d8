import { EngineInputError } from "#app/engine/errors.ts";
import type { FilmAddition, FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { incomingFromBows } from "#app/engine/flow/silicon.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import type { Measured } from "#app/engine/measured.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { LotInput } from "#app/schemas/lot.ts";

/**
 * A flow with a lot's own incoming figures in place of those that it was assessed for.
 *
 * A flow keeps the bow that its wafers come in with as the films that its receipt puts down: what a fab's back end pulls with. The
 * thickest of them gets the stress that makes the wafer, once received, as bowed as the lot was measured; everything else stays,
 * so the bow that was assessed gives back the flow that was assessed. A flow without such a film gets the bow as an incoming
 * shape that films cause. Either way it grows as the wafer is thinned. Tolerances stay what they are: a mean says nothing of its
 * spread.
 */

/** How near the bow is brought to the measured one, m. */
const CLOSE = 1e-9;
const TRIES = 25;
/** First change of stress, Pa, from which the slope is told. */
const FIRST_STEP = 1e6;

/**
 * @throws EngineInputError naming `lot.bow` or `lot.thickness` when no flow comes of it
 */
export function withLot(input: AssessmentInput, lot: Omit<LotInput, "wafers">): AssessmentInput {
  const { flow } = input;
  const note = `lot ${lot.name}`;
  const thickness =
    lot.thickness === null ? flow.wafer.thickness : measuredOn(flow.wafer.thickness, lot.thickness, note);
  const thick = { ...flow, wafer: { ...flow.wafer, thickness } };
  return { ...input, flow: withGate(withBow({ ...input, flow: thick }, lot.bow, note), lot) };
}

/** The quantity as the lot has it; its tolerance is that of the flow. */
function measuredOn({ tolerance }: Measured, value: number, note: string): Measured {
  return { value, tolerance, source: "measured here", note, on: null };
}

/** Judged against what it is assessed for now, which is what it came in with. */
function withGate(flow: FlowInput, { name, bow, warp, thickness, edgeChips, identity }: Omit<LotInput, "wafers">) {
  const accepted = flow.gate?.bow ?? null;
  return {
    ...flow,
    gate: {
      ...flow.gate,
      bow: accepted && { ...accepted, value: bow },
      lot: { name, bow, warp, thickness: thickness ?? flow.wafer.thickness.value, edgeChips, identity },
    },
  };
}

function withBow(input: AssessmentInput, bow: number, note: string): FlowInput {
  const { flow } = input;
  const at = equivalentFilm(flow);
  if (at === null) {
    const measured: Measured = { value: bow, tolerance: null, source: "measured here", note };
    const filmShare: Measured = { value: 1, tolerance: null, source: "assumed", note: "taken as film" };
    const incoming = incomingFromBows({ radius: flow.wafer.diameter / 2, bowX: measured, bowY: measured, filmShare });
    return { ...flow, wafer: { ...flow.wafer, incoming } };
  }
  const [receipt] = flow.steps;
  const stress = receipt?.adds[at]?.stress;
  if (!receipt || !stress) return flow;
  const trial = (value: number) =>
    withStress(flow, at, value === stress.value ? stress : measuredOn(stress, value, note));
  const found = solve((value) => bowOnReceipt({ ...input, flow: trial(value) }) - bow, stress.value);
  return withStress(flow, at, measuredOn(stress, found, note));
}

/** Which film of the receipt stands for the bow that comes in: the thickest on the device side, else on the back; null for none. */
function equivalentFilm({ steps: [first] }: FlowInput): number | null {
  if (first?.kind !== "receive" || first.adds.length === 0) return null;
  const front = first.adds.filter(({ side }) => side === "front");
  const candidates = front.length > 0 ? front : first.adds;
  return first.adds.indexOf(
    candidates.reduce((most, next) => (next.thickness.value > most.thickness.value ? next : most)),
  );
}

function withStress(flow: FlowInput, at: number, stress: Measured): FlowInput {
  const change = (addition: FilmAddition): FilmAddition => ({ ...addition, stress, stressRecord: null });
  const steps = flow.steps.map((step, index): StepInput =>
    index === 0 ? { ...step, adds: step.adds.map((addition, n) => (n === at ? change(addition) : addition)) } : step,
  );
  return { ...flow, steps };
}

/** Standard bow of the wafer once received, 25 °C, m. */
export function bowOnReceipt({ flow, limits }: AssessmentInput): number {
  const [receipt] = flow.steps;
  // Slots that skip the receipt are of no other lot: what comes in is what the others receive.
  const received = walkFlow({ ...flow, steps: receipt ? [{ ...receipt, slots: null }] : [] }, limits).steps[0];
  const shape = received?.released;
  if (!shape || shape.regime === "curled")
    throw new EngineInputError(
      "lot.bow",
      "is more than the wafer can have: it would roll up",
      "a bow before it rolls up",
    );
  return standardBow(shape.sagitta);
}

/** Where a nearly straight line crosses zero, by secants. */
function solve(miss: (value: number) => number, start: number): number {
  let [before, missBefore] = [start, miss(start)];
  if (Math.abs(missBefore) < CLOSE) return before;
  let now = start + FIRST_STEP;
  for (let n = 0; n < TRIES; n += 1) {
    const missNow = miss(now);
    if (Math.abs(missNow) < CLOSE) return now;
    if (missNow === missBefore) break;
    const next = now - (missNow * (now - before)) / (missNow - missBefore);
    [before, missBefore, now] = [now, missNow, next];
  }
  throw new EngineInputError("lot.bow", "cannot come from the films that the wafer is received with", "a smaller bow");
}
