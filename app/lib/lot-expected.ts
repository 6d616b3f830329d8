import { tightestStep } from "#app/engine/flow/answer.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { sharedBy } from "#app/engine/rules/share-beyond.ts";
import { normalShareBelow } from "#app/engine/uncertainty/random/inverse-normal.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";

/** Share of wafers expected beyond the flow's tightest limit, from its tolerances alone. */
export interface ExpectedShare {
  step: number;
  title: string;
  /** 0 to 1 */
  share: number;
  /** 95 % of lots lie in between: what is common to a lot moves all of its wafers together */
  lots: [number, number];
  /** the slots that it is of, those that come out worst; null where the flow does not part by slot */
  slots: number[] | null;
  /** what it rests on, a sentence; empty when there is nothing to name */
  by: string;
}

const WIDE = 1.96;

/**
 * What any lot of a flow comes to at its tightest limit; null where no step has a limit, a warp with a tolerance, or a wafer that
 * does not roll up. What a wafer comes in with, its thickness and the films of its receipt, is taken to differ from wafer to
 * wafer; everything else is common to a lot. All of it is taken as normal, as rule 2 does.
 */
export function expectedShare(flow: FlowInput, result: AssessmentResult): ExpectedShare | null {
  const tightest = tightestStep(result);
  const warp = tightest?.figures[0];
  const all = warp?.standardUncertainty ?? 0;
  if (!tightest?.limit || !warp || all === 0) return null;
  const loaded = warp.label.endsWith("as it is loaded");
  const at = result.steps[tightest.step - (loaded ? 2 : 1)];
  if (!at || at.atRoom?.regime === "curled") return null;
  const own = incomingLabels(flow);
  const square = at.budget.reduce((sum, { input, contribution }) => sum + (own.has(input) ? contribution ** 2 : 0), 0);
  const between = Math.min(all, Math.sqrt(square));
  const common = Math.sqrt(all ** 2 - between ** 2);
  const beyond = tightest.limit.value;
  // Without a spread of its own a lot is beyond the limit as a whole, or not at all.
  const ofLot = (moved: number) =>
    between === 0 ? Number(moved > beyond) : 1 - normalShareBelow((beyond - moved) / between);
  return {
    step: tightest.step,
    title: result.steps[tightest.step - 1]?.title ?? "",
    share: 1 - normalShareBelow((beyond - warp.value) / all),
    lots: [ofLot(warp.value - WIDE * common), ofLot(warp.value + WIDE * common)],
    slots: result.slots ?? null,
    by: sharedBy(at.budget),
  };
}

/** How the budget calls what a wafer comes in with. */
function incomingLabels({ steps: [first] }: FlowInput): Set<string> {
  const labels = ["Incoming silicon thickness", "Incoming curvature along x", "Incoming curvature along y"];
  const films = first?.kind === "receive" ? first.adds.map(({ film }) => film.name) : [];
  return new Set([...labels, ...films.flatMap((name) => [`${name}, stress`, `${name}, thickness at step 1`])]);
}
