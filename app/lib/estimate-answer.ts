import { EngineInputError } from "#app/engine/errors.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { estimateStack, type StackEstimate } from "#app/engine/stack/estimate-stack.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { stackSupport } from "#app/engine/stack/stack-support.ts";
import { curlingThickness, thicknessSweep } from "#app/engine/stack/thickness-sweep.ts";
import { warpUncertainty } from "#app/engine/stack/warp-uncertainty.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import type { EstimateAnswer, EstimateFault, EstimateRequest } from "#app/schemas/estimate.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { stackOf } from "./stack-of-request.ts";

/** A request that cannot be estimated, with every fault and where it is. */
export class EstimateRefused extends Error {
  constructor(readonly faults: EstimateFault[]) {
    super(faults.map(({ pointer, detail }) => `${pointer} ${detail}`).join("; "));
  }
}

/** Makes the workings of an estimate with the words of their equations. */
export type WorkingsOf = (stack: StackInput, estimate: StackEstimate) => NonNullable<EstimateAnswer["working"]>;

const NO_LIMITS = "no thickness limits are set for a wafer this large";

/** Where the search for the curling limit starts, m: the thickest silicon that anybody asks about, as long as that is a plate. */
function thickest({ diameter_m, thickness_m }: EstimateRequest["wafer"]): number {
  return Math.max(thickness_m, Math.min(RULES.siliconThickness.range.most, diameter_m / 20));
}

/**
 * The one way from a request to its answer: the API, every screen and the page that computes while somebody types go through here,
 * so they agree to the last digit. It pauses between its parts, none of which takes a frame, so that a page can paint meanwhile.
 * @param workingsOf makes the workings that the request asks for; null leaves them out
 * @throws EstimateRefused with pointers for what the engine cannot take
 */
export function* estimating(
  request: EstimateRequest,
  limits: SiteLimits,
  workingsOf: WorkingsOf | null,
): Generator<undefined, EstimateAnswer, undefined> {
  const stack = stackOf(request);
  try {
    const estimate = estimateStack(stack);
    const { shape, filmForce } = estimate;
    const support = stackSupport(stack, limits);
    yield;
    const uncertainty = warpUncertainty(stack);
    yield;
    const curlsBelow = curlingThickness(stack, thickest(request.wafer));
    yield;
    return {
      engine_version: ENGINE_VERSION,
      stoney: { bow_m: standardBow(estimate.stoney.sagitta) },
      laminate: { bow_m: standardBow(estimate.laminate.sagitta) },
      shape: {
        regime: shape.regime,
        bow_m: standardBow(shape.bowMajor),
        across: estimate.unequal && {
          bow_m: standardBow(shape.bowMinor),
          axis_rad: axisOf(estimate.unequal.principal.angle + shape.majorAngle),
        },
        warp_m: shape.warp,
        roll_radius_m: shape.rollRadius,
        stability_ratio: shape.stabilityRatio,
        warp_standard_uncertainty_m: uncertainty?.standardUncertainty ?? null,
        warp_linear: uncertainty?.linear ?? null,
      },
      support: support ?? { class: null, because: NO_LIMITS },
      film_force: {
        front_N_per_m: filmForce.front,
        back_N_per_m: filmForce.back,
        films_N_per_m: filmForce.films,
      },
      curls_below_m: curlsBelow,
      ...(request.sweep && { sweep: sweepOf(stack, request.sweep) }),
      ...(request.working && workingsOf && { working: workingsOf(stack, estimate) }),
    };
  } catch (error) {
    if (error instanceof EngineInputError) throw new EstimateRefused([faultOf(error, request)]);
    throw error;
  }
}

/** The angle of an axis, which has no head, above −π/2 and up to π/2. */
const axisOf = (angle: number) => angle - Math.PI * Math.ceil(angle / Math.PI - 0.5);

function sweepOf(stack: StackInput, { from_m, to_m, points }: NonNullable<EstimateRequest["sweep"]>) {
  return thicknessSweep(stack, { from: from_m, to: to_m, points }).map((point) => ({
    thickness_m: point.thickness,
    warp_m: point.warp,
    linear_warp_m: point.linearWarp,
    regime: point.regime,
  }));
}

/** Names of the engine's layer properties in a request. */
const FILM_FIELDS: Record<string, string> = {
  thickness: "thickness_m",
  stress: "stress_Pa",
  youngsModulus: "youngs_modulus_Pa",
  poissonsRatio: "poissons_ratio",
  cte: "cte_per_K",
  referenceTemperature: "reference_temperature_K",
  coverage: "coverage",
  lineWidth: "lines/width_m",
  direction: "lines/direction_rad",
};

/** Other inputs that the engine may refuse; what is not listed concerns the films together. */
const OTHER_FIELDS: Record<string, string> = {
  "wafer.thicknessTolerance": "/wafer/thickness_tolerance_m",
  temperature: "/temperature_K",
  from: "/temperature_K",
  to: "/temperature_K",
  sweep: "/sweep",
  "sweep.points": "/sweep/points",
};

/** Where in the request a refusal of the engine points. The engine counts layers from the bottom up, silicon among them. */
function faultOf({ field, reason, allowed }: EngineInputError, { films }: EstimateRequest): EstimateFault {
  const detail = allowed ? `${reason} (allowed: ${allowed})` : reason;
  const [, number, property = ""] = /^layers\[(\d+)\]\.(\w+)/.exec(field) ?? [];
  if (number === undefined) {
    const pointer = OTHER_FIELDS[field];
    // Nothing in the request has this name: it is what the films together come to.
    return pointer ? { pointer, detail } : { pointer: "/films", detail: `${field} ${detail}` };
  }
  const indices = films.map((_, index) => index);
  const back = indices.filter((index) => films[index]?.side === "back").toReversed();
  const front = indices.filter((index) => films[index]?.side === "front");
  const film = [...back, null, ...front][Number(number)] ?? null;
  if (film === null) return { pointer: "/wafer", detail };
  const name = FILM_FIELDS[property];
  return { pointer: name ? `/films/${film}/${name}` : `/films/${film}`, detail };
}
