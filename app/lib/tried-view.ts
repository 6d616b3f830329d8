import type { Finding } from "#app/engine/rules/finding.ts";
import { outcomeRank, type Outcome } from "#app/engine/vocabulary.ts";
import type { TrialHead } from "#app/schemas/trial.ts";
import { figureText } from "./assessment-figure.ts";
import { bySeverity } from "./assessment-finding.ts";
import type { PlaceView } from "./remedies-view.ts";
import { shownWorking, type ShownWorking } from "./shown-working.ts";

/** How a rule judges a step, before or after a change. */
export interface TriedSide {
  outcome: Outcome;
  /** 'Warp, as it leaves: 211 µm'; null where the rule rests on no figure */
  figure: string | null;
  limit: string | null;
}

/** One rule at one step, before and after. Steps are numbered as before the change. */
export interface TriedRow extends PlaceView {
  title: string;
  before: TriedSide | null;
  after: TriedSide | null;
}

/** The calculations of one row. */
export interface TriedWorkings extends PlaceView {
  title: string;
  before: { reason: string; working: ShownWorking | null } | null;
  after: { reason: string; working: ShownWorking | null } | null;
}

export interface TriedView {
  rows: TriedRow[];
  shown: TriedWorkings | null;
}

/** What the page of a change that was tried shows. */
export interface TriedPageData {
  head: TrialHead;
  engineVersion: string;
  /** the change, as it is posted and in words */
  posted: string;
  changes: string[];
  verdict: { before: Outcome; after: Outcome };
  view: TriedView;
}

type Pair = PlaceView & { before: Finding | null; after: Finding | null };

/**
 * What a change does to the findings: every rule at every step that it judges otherwise, worst first, and the one that was asked for.
 * @param origins numbers of the changed flow's steps before the change; null for one that the change has put in, whose findings have
 * nothing to be held against and are left out
 */
export function triedView(
  before: readonly Finding[],
  after: readonly Finding[],
  origins: readonly (number | null)[],
  asked: PlaceView | null,
): TriedView {
  const pairs = new Map<string, Pair>();
  const note = (finding: Finding, step: number | null, side: "before" | "after") => {
    if (step === null) return;
    const key = `${finding.rule} ${step}`;
    const pair = pairs.get(key) ?? { rule: finding.rule, step, before: null, after: null };
    const known = pair[side];
    if (!known || outcomeRank(finding.outcome) > outcomeRank(known.outcome)) pair[side] = finding;
    pairs.set(key, pair);
  };
  for (const finding of before) note(finding, finding.step, "before");
  for (const finding of after) note(finding, origins[finding.step - 1] ?? null, "after");
  const isAsked = ({ rule, step }: PlaceView) => rule === asked?.rule && step === asked.step;
  const rows = [...pairs.values()]
    .filter((pair) => isAsked(pair) || outcomeOf(pair.before) !== outcomeOf(pair.after))
    .sort((a, b) => bySeverity(worst(a), worst(b)) || a.step - b.step);
  const shown = rows.find(isAsked) ?? rows[0];
  return { rows: rows.map(rowOf), shown: shown ? workingsOf(shown) : null };
}

/** A rule that has nothing to say finds nothing against the step. */
const outcomeOf = (finding: Finding | null): Outcome => finding?.outcome ?? "clear";

const worst = ({ before, after }: Pair) => ({
  outcome: outcomeRank(outcomeOf(before)) > outcomeRank(outcomeOf(after)) ? outcomeOf(before) : outcomeOf(after),
});

const titleOf = ({ before, after }: Pair) => (before ?? after)?.title ?? "";

function rowOf(pair: Pair): TriedRow {
  const { rule, step, before, after } = pair;
  return { rule, step, title: titleOf(pair), before: before && sideOf(before), after: after && sideOf(after) };
}

function sideOf({ outcome, figures: [figure], limit }: Finding): TriedSide {
  return {
    outcome,
    figure: figure ? `${figure.label}: ${figureText(figure)}` : null,
    limit: limit && `${limit.label}: ${figureText(limit)}`,
  };
}

function workingsOf(pair: Pair): TriedWorkings {
  const side = (finding: Finding | null) => {
    if (!finding) return null;
    const working = finding.figures.find((figure) => figure.working)?.working;
    return { reason: finding.reason, working: working ? shownWorking(working) : null };
  };
  const { rule, step, before, after } = pair;
  return { rule, step, title: titleOf(pair), before: side(before), after: side(after) };
}
