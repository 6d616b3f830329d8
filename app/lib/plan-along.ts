import { spansOfKinds } from "#app/engine/finder/bond-spans.ts";
import { legsOfSteps, takes } from "#app/engine/flow/legs.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import type { ShownStep } from "./flow-rows.ts";

/** What holds a wafer between two carriers, where there is no room for both names. */
export const BOTH_CARRIERS = "both carriers";

/** A carrier that a wafer is on, and by which face. */
export interface OnCarrier {
  name: string;
  face: Side;
}

/**
 * What a plan carries on from step to step, once for each leg whose wafers take the step, without repeats: the silicon that is left
 * after it, the carriers that they come on and leave on.
 */
export interface Along {
  silicon: Measured[];
  before: OnCarrier[][];
  after: OnCarrier[][];
}

/** What is carried on at each step of a plan. */
export function planAlong(steps: readonly ShownStep[], incoming: Measured): Along[] {
  const legs = legsOfSteps(steps.map(({ handling }) => ({ slots: handling?.slots ?? null }))).map((slots) =>
    legAlong(steps, incoming, slots[0] ?? 1),
  );
  return steps.map((_, index) => {
    const taken = legs.flatMap((leg) => leg[index] ?? []);
    return {
      silicon: unlike(taken.map(({ silicon }) => silicon)),
      before: unlike(taken.map(({ before }) => before)),
      after: unlike(taken.map(({ after }) => after)),
    };
  });
}

interface LegStep {
  silicon: Measured;
  before: OnCarrier[];
  after: OnCarrier[];
}

/** The same for the wafer of one slot; null at steps that it does not take. */
function legAlong(steps: readonly ShownStep[], incoming: Measured, slot: number): (LegStep | null)[] {
  const taken = steps.map(({ handling }) => takes({ slots: handling?.slots ?? null }, slot));
  const spans = spansOfKinds(
    steps.map(({ kind, carrier, handling }, index) => ({
      ...handling,
      kind: !taken[index] || (kind === "bond" && !carrier) ? null : kind,
    })),
  );
  const onAt = (number: number) =>
    spans.flatMap(({ from, to, face }) => {
      const name = steps[from - 1]?.carrier?.name;
      return name !== undefined && from <= number && (to === null || number < to) ? [{ name, face }] : [];
    });
  let silicon = incoming;
  return steps.map(({ siliconAfter }, index) => {
    if (!taken[index]) return null;
    silicon = siliconAfter ?? silicon;
    return { silicon, before: onAt(index), after: onAt(index + 1) };
  });
}

function unlike<Item>(items: readonly Item[]): Item[] {
  return [...new Map(items.map((item) => [JSON.stringify(item), item])).values()];
}
