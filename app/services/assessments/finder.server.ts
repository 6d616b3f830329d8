import { EngineInputError } from "#app/engine/errors.ts";
import { bondSpans } from "#app/engine/finder/bond-spans.ts";
import { findBonds, type WarpTarget } from "#app/engine/finder/find-bonds.ts";
import { finderRow } from "#app/lib/finder-rows.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { RULES } from "#app/schemas/ranges.ts";
import type { FinderAsked, FinderPageData, FinderRow } from "#app/schemas/finder.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { trialGround, trialHead } from "./trial-ground.server.ts";

/** Every carrier and bond tried in the place of one of an assessment's bonds; `rows` is null when the engine refuses the flow. */
export interface Finder extends FinderPageData {
  rows: FinderRow[] | null;
}

/**
 * Tries the site's carriers and bonding materials against an assessment's flow, as the address asks: which bond, and a target warp
 * at a step. A target that is not understood is said, and left out.
 */
export async function finderOf(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams,
): Promise<Finder> {
  const ground = await trialGround(scope, assessmentId, search);
  const { flow, limits } = ground.input;
  const spans = bondSpans(flow);
  const { asked, target } = readAsked(search, { bonds: spans.length, steps: flow.steps.length });
  const page = {
    head: trialHead(ground),
    bonds: spans.map(({ from }, index) => ({ index, label: `Step ${from}, ${flow.steps[from - 1]?.title ?? ""}` })),
    steps: flow.steps.map(({ title }, index) => ({ number: index + 1, title })),
    asked,
  };
  if (spans.length === 0) return { ...page, rows: [], tried: 0, fits: 0 };
  try {
    const found = findBonds(flow, limits, ground.catalogue, { bond: asked.bond, target });
    const rows = found.tried.map((each) => finderRow(each, found.span.from));
    return { ...page, rows, tried: rows.length, fits: rows.filter(({ fits }) => fits).length };
  } catch (error) {
    if (error instanceof EngineInputError) return { ...page, rows: null, tried: 0, fits: 0 };
    throw error;
  }
}

function readAsked(
  search: URLSearchParams,
  { bonds, steps }: { bonds: number; steps: number },
): { asked: FinderAsked; target: WarpTarget | null } {
  const text = (name: string) => (search.get(name) ?? "").trim().slice(0, 40);
  const [targetStep, targetWarp] = [text("step"), text("warp")];
  const bond = Number.parseInt(text("bond"), 10);
  const asked: FinderAsked = { bond: bond >= 0 && bond < bonds ? bond : 0, targetStep, targetWarp, faults: {} };
  if (targetStep === "" && targetWarp === "") return { asked, target: null };
  const step = /^\d{1,3}$/.test(targetStep) ? Number(targetStep) : 0;
  if (step < 1 || step > steps) asked.faults.targetStep = "Choose the step that the target is for.";
  const read = readQuantity(targetWarp, { ...RULES.warpLimit, label: "target warp" });
  if (!read.ok) asked.faults.targetWarp = read.message;
  return {
    asked,
    target: read.ok && !asked.faults.targetStep ? { step, warp: read.value } : null,
  };
}
