import { requireFinite } from "../inputs.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { SamplingProgress } from "../uncertainty/sample-uncertainty.ts";
import { stepsSampling } from "../uncertainty/sample-steps.ts";
import type { Chance, SampledUncertainty } from "../uncertainty/summary.ts";
import type { FaceUp } from "../vocabulary.ts";
import type { FlowInput } from "./model.ts";
import { faceUpLoaded } from "./state.ts";
import { flowUncertainty } from "./uncertainty.ts";
import { unknowns } from "./unknowns.ts";
import { walkFlow, type StepState } from "./walk.ts";
import { MOMENTS, warpResponses, type Moment, type WarpResponse } from "./warp-response.ts";

/** Which way the edges point on the tool. */
export type Edges = "up" | "down";

/** When a wafer is held against a tool's limit, as the warp rule does. */
export type HeldWhen = "as it is loaded" | "as it leaves" | "free at peak";

/** Share of wafers beyond one limit of a step's tool. */
export interface ShareBeyond {
  edges: Edges;
  /** m */
  limit: number;
  when: HeldWhen;
  chance: Chance;
}

/** Spread of the warp of a step, m, positive with the edges up on its tool, negative with the edges down. */
export interface SampledWarp {
  moment: Moment;
  nominal: number;
  /** 5 % and 95 % of the wafers drawn lie below these; what finite drawing leaves of either as standard error */
  band: [number, number];
  standardErrors: [number, number];
  /** the same two by first order: nominal value and standard uncertainty, taken as normal */
  firstOrder: [number, number];
}

/** What the wafers drawn say of a step. */
export interface SampledStep {
  step: number;
  /** at 25 °C as it leaves, then at peak where its tool leaves it free; none where it is held flat */
  warps: SampledWarp[];
  /** one for each limit of the tool and each moment that is held against it */
  beyond: ShareBeyond[];
}

export interface SampledWarps {
  draws: number;
  /** inputs with a tolerance, which are what is drawn */
  inputs: number;
  steps: SampledStep[];
}

/** Share of a normal distribution on either side of the band's ends, in standard deviations: 5 % beyond each. */
const NORMAL_90 = 1.6448536269514722;
const LOW = 0.05;

/**
 * Wafers drawn within the tolerances of all inputs, each rectangular over its interval (JCGM 101:2008, clause 7), and carried through
 * every step of a flow: the same film is the same film at every step. Warps come from `warpResponses`. Against drawing on the walk
 * itself both ends of the band lie within 2 % of its width, and single wafers within 2 % of it (root mean square), in the six demo
 * flows with 32 to 42 inputs (own computation, 600 wafers each). Yields how far it is after every 128 wafers. The same seed gives
 * the same figures on every machine.
 * @throws EngineInputError when the flow as stated cannot be walked, or a wafer drawn cannot be computed
 */
export function* sampledWarps(
  flow: FlowInput,
  limits: SiteLimits,
  { draws, seed }: { draws: number; seed: number },
): Generator<SamplingProgress, SampledWarps, void> {
  const { steps } = walkFlow(flow, limits);
  const uncertainty = flowUncertainty(flow);
  const varied = unknowns(flow);
  const responses = warpResponses(flow, varied);
  const tasks = steps.flatMap((state, index) =>
    MOMENTS.flatMap((moment) => {
      const response = responses[index]?.[moment];
      const wanted = moment === "atRoom" || freeAtPeak(state);
      return response && wanted ? [{ index, moment, response }] : [];
    }),
  );
  const sampled = yield* stepsSampling({
    steps: tasks.map(({ response: { model, uses } }) => ({ model, uses })),
    inputs: varied.map(({ label, measured: { tolerance } }, n) => ({
      name: `${n} ${label}`,
      value: 0,
      distribution: "rectangular",
      halfWidth: tolerance ?? 0,
    })),
    draws,
    seed,
  });
  const found = new Map(
    tasks.map(({ index, moment, response }, n) => [keyOf(index, moment), { response, drawn: sampled[n] }]),
  );
  const drawnAt = (index: number, moment: Moment) => {
    const { response, drawn } = found.get(keyOf(index, moment)) ?? {};
    return response && drawn ? { response, drawn } : null;
  };
  return {
    draws,
    inputs: varied.length,
    steps: steps.map((state, index): SampledStep => ({
      step: state.number,
      warps: MOMENTS.flatMap((moment) => {
        const at = drawnAt(index, moment);
        const u = uncertainty[index]?.[moment] ?? 0;
        return at ? [warpOf(moment, at.response, at.drawn, { faceUp: state.after.faceUp, u })] : [];
      }),
      beyond: [
        ...sharesOf(state, "as it is loaded", drawnAt(index - 1, "atRoom")),
        ...sharesOf(state, "as it leaves", drawnAt(index, "atRoom")),
        ...sharesOf(state, "free at peak", drawnAt(index, "atPeak")),
      ],
    })),
  };
}

const keyOf = (index: number, moment: Moment) => `${index} ${moment}`;
const freeAtPeak = ({ step }: StepState) => step.equipment?.atPeak === "free";

/** A bowl has its edges up with the device side up, and down with the back side up. */
const turned = (faceUp: FaceUp) => (faceUp === "device side" ? 1 : -1);

function warpOf(
  moment: Moment,
  { nominal }: WarpResponse,
  drawn: SampledUncertainty,
  { faceUp, u }: { faceUp: FaceUp; u: number },
): SampledWarp {
  const sign = turned(faceUp);
  const inOrder = (low: number, high: number): [number, number] => (sign > 0 ? [low, high] : [-high, -low]);
  const errors = [drawn.standardErrorOfQuantile(LOW), drawn.standardErrorOfQuantile(1 - LOW)] as const;
  return {
    moment,
    nominal: sign * requireFinite("nominal", nominal),
    band: inOrder(drawn.quantile(LOW), drawn.quantile(1 - LOW)),
    standardErrors: sign > 0 ? [errors[0], errors[1]] : [errors[1], errors[0]],
    firstOrder: inOrder(nominal - NORMAL_90 * u, nominal + NORMAL_90 * u),
  };
}

/** Shares beyond both limits of a step's tool, of the wafers as they lie there. */
function sharesOf(
  { step, before, after }: StepState,
  when: HeldWhen,
  at: { drawn: SampledUncertainty } | null,
): ShareBeyond[] {
  const { equipment } = step;
  if (!equipment || !at) return [];
  const sign = turned(when === "as it is loaded" ? faceUpLoaded(before, step) : after.faceUp);
  const share = (edges: Edges, limit: number | undefined): ShareBeyond[] => {
    if (limit === undefined) return [];
    if ((edges === "up") === sign > 0) return [{ edges, limit, when, chance: at.drawn.chanceAbove(limit) }];
    const { probability, standardError } = at.drawn.chanceAbove(-limit);
    return [{ edges, limit, when, chance: { probability: 1 - probability, standardError } }];
  };
  return [...share("up", equipment.warpLimitEdgesUp?.value), ...share("down", equipment.warpLimitEdgesDown?.value)];
}
