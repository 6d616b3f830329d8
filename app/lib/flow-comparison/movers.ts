import type { FlowInput } from "#app/engine/flow/model.ts";
import { movedWalk, nominalWalk, type ReadStep } from "#app/engine/flow/moved-walks.ts";
import { peakShape, roomShape } from "#app/engine/flow/step.ts";
import { firstTouched, unknowns, type Unknown } from "#app/engine/flow/unknowns.ts";
import type { Moment } from "#app/engine/flow/warp-response.ts";

/** An input whose tolerance moves a warp: by `moves`, m, to either side on the mean. */
export interface FlowMover {
  unknown: Unknown;
  moves: number;
  /** whether both ends of its tolerance can be computed: else it is what the one that can be moves */
  whole: boolean;
}

/** Share of the largest below which an input is said to move nothing. */
const NOTHING = 1e-6;

/**
 * The inputs of a flow by how far their tolerances move the warp after a step, largest first: half the distance between two walks with
 * the input at both ends of its tolerance, by the full model. Of a flow that parts by slot it takes a leg.
 * @throws EngineInputError when the flow as stated cannot be walked
 */
export function flowMovers(whole: FlowInput, { step, moment }: { step: number; moment: Moment }): FlowMover[] {
  const flow = { ...whole, steps: whole.steps.slice(0, step) };
  const read: ReadStep<number | null> = (wafer, walked) =>
    (moment === "atRoom" ? roomShape(wafer, walked) : peakShape(wafer, walked))?.warp ?? null;
  const nominal = nominalWalk(flow, read);
  const stated = nominal.readings[step - 1] ?? null;
  if (stated === null) return [];
  const movers = unknowns(flow).map((unknown): FlowMover => {
    const reach = unknown.measured.tolerance ?? 0;
    const end = (by: number) => {
      const walk = movedWalk(flow, nominal, unknown, by, read);
      // A walk that has come back to the nominal wafer ends early.
      return walk && (walk[step - 1 - firstTouched(unknown)] ?? stated);
    };
    const [up, down] = [end(reach), end(-reach)];
    return {
      unknown,
      moves: up === null || down === null ? Math.abs((up ?? down ?? stated) - stated) : Math.abs(up - down) / 2,
      whole: up !== null && down !== null,
    };
  });
  const largest = Math.max(0, ...movers.map(({ moves }) => moves));
  return movers.filter(({ moves }) => moves > NOTHING * largest).toSorted((a, b) => b.moves - a.moves);
}
