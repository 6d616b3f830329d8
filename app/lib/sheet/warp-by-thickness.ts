import { EngineInputError } from "#app/engine/errors.ts";
import { legFlows } from "#app/engine/flow/legs.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { WaferState } from "#app/engine/flow/state.ts";
import { thinnedShape } from "#app/engine/flow/thinned.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { SheetEngineers } from "#app/schemas/sheet-document.ts";
import { HALF_TURN, LEAST_DRAWN, limitLines } from "../stack-chart.ts";
import { limitWords } from "../stack-words.ts";

type WarpByThickness = NonNullable<SheetEngineers["plot"]>;

/** Thicknesses that a curve is computed at, evenly on a logarithmic scale. */
const POINTS = 72;
/** The axis reaches down to this, or to a little below what the flow ends with, m. */
const THINNEST = 40e-6;
const HALVINGS = 24;

/**
 * Warp of the free wafer at 25 °C against silicon thickness, with the films that it has at the end of its flow, and with those of
 * the device side alone where it has some on its back. Null when it stays as good as flat, or was only ever as thick as it came.
 * @param slots those of the leg, of a flow that parts by slot
 */
export function warpByThickness(
  { flow, limits }: AssessmentInput,
  slots: readonly number[] | null,
): WarpByThickness | null {
  const walked = legOf(flow, slots);
  const { steps } = walkFlow(walked, limits);
  const state = steps.findLast(({ after }) => !after.diced)?.after;
  if (!state) return null;
  const full = flow.wafer.thickness.value;
  const final = state.silicon.value;
  const range = { from: Math.min(THINNEST, final / 1.25), to: full };
  const curve = (of: WaferState) => drawnWarps(flow, of, range);
  const all = curve(state);
  if (!all.some(({ y }) => y >= limits.flatWithin.value)) return null;
  const front = state.back.length === 0 ? null : { ...state, back: [] };
  const curls = curlingBelow(flow, state, range);
  const series: WarpByThickness["series"] = [
    { id: "all", label: front ? "all films" : "films as they are", points: all },
    ...(front ? [{ id: "front" as const, label: "front films only", points: curve(front) }] : []),
  ];
  return {
    series: series.filter(({ points }) => points.length > 1),
    thicknessLimits: limitLines(flow.wafer.diameter, limits).map(({ value, lines }) => ({ value, lines: [...lines] })),
    curling: curls === null ? null : { thickness: curls, label: `curls below ${limitWords(curls)}` },
    chosenThickness: final < full ? final : null,
    label: `Warp of the free wafer at 25\u00A0°C against silicon thickness${curls === null ? "" : `: free, it curls below ${limitWords(curls)}`}`,
  };
}

function legOf(flow: FlowInput, slots: readonly number[] | null): FlowInput {
  const legs = legFlows(flow);
  const [first] = legs;
  const found = legs.find(({ leg }) => slots === null || leg?.slots.join() === slots.join()) ?? first;
  if (!found) throw new Error("a flow has at least one leg");
  return found;
}

interface Range {
  from: number;
  to: number;
}

/** Shape at a thickness; null where the wafer would bend beyond anything that can be computed. */
function shapeAt(flow: FlowInput, state: WaferState, thickness: number) {
  try {
    return thinnedShape(flow.wafer, state, thickness);
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}

/** From the thick end down to where the roll passes half a turn, without what is as good as flat. */
function drawnWarps(flow: FlowInput, state: WaferState, { from, to }: Range) {
  const stop = (HALF_TURN * flow.wafer.diameter) / 2;
  const points: { x: number; y: number }[] = [];
  for (let n = POINTS - 1; n >= 0; n -= 1) {
    const thickness = n === POINTS - 1 ? to : from * (to / from) ** (n / (POINTS - 1));
    const warp = shapeAt(flow, state, thickness)?.warp ?? Infinity;
    if (warp >= stop) break;
    if (warp >= LEAST_DRAWN) points.unshift({ x: significant(thickness), y: significant(warp) });
  }
  return points;
}

/** The document is kept for ever: four digits are more than a plot shows. */
const significant = (value: number) => Number(value.toPrecision(4));

function curlingBelow(flow: FlowInput, state: WaferState, { from, to }: Range): number | null {
  const rolls = (thickness: number) => (shapeAt(flow, state, thickness)?.regime ?? "curled") === "curled";
  if (rolls(to)) return significant(to);
  let stable = to;
  for (let n = POINTS - 2; n >= 0; n -= 1) {
    const next = from * (to / from) ** (n / (POINTS - 1));
    if (rolls(next)) {
      let [low, high] = [next, stable];
      for (let halving = 0; halving < HALVINGS; halving += 1) {
        const middle = Math.sqrt(low * high);
        if (rolls(middle)) low = middle;
        else high = middle;
      }
      return significant(high);
    }
    stable = next;
  }
  return null;
}
