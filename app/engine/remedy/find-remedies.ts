import { worstOutcome } from "../flow/judge.ts";
import type { FlowInput } from "../flow/model.ts";
import type { Finding } from "../rules/finding.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { Catalogue } from "../trial/catalogue.ts";
import type { FlowChange } from "../trial/change.ts";
import { blocks } from "../trial/margin.ts";
import { judged, walked } from "../trial/trial-walk.ts";
import { outcomeRank, type Outcome } from "../vocabulary.ts";
import { candidatesFor } from "./candidates.ts";
import { smallestChange, type TriedChange } from "./smallest.ts";
import { better, findingsAfter, standingAfter, type Place, type Standing, type Trials } from "./try-change.ts";

/** A finding that a change makes worse, or brings in. `step` counts in the changed flow. */
export interface Worsened {
  rule: number;
  step: number;
  outcome: Outcome;
  reason: string;
}

/** A change that clears a finding, and what else it does. */
export interface Remedy {
  changes: FlowChange[];
  /** how the rule judges the step with it */
  standing: Standing;
  /** verdict of the whole flow with it */
  verdict: Outcome;
  worsens: Worsened[];
  /** how many other steps' findings are clear with it that were not */
  alsoClears: number;
}

/** What was found for one rule at one step that is not clear. */
export interface RemedyAnswer extends Place {
  title: string;
  outcome: Outcome;
  reason: string;
  /** what the rule itself says would clear it */
  says: string | null;
  /** single changes, the smallest that does least harm first */
  remedies: Remedy[];
  /** without a single one: the two changes that come closest together; null where nothing comes closer */
  pair: Remedy | null;
  /** how many quantities were tried */
  tried: number;
}

/** How far a search is: findings looked into, and what was found for them; the list grows while the search runs. */
export interface RemedyProgress {
  done: number;
  of: number;
  answers: readonly RemedyAnswer[];
}

/** How many changes are named for one finding. */
const NAMED = 3;
/** How many of the nearest changes are tried two by two. */
const PAIRED = 4;

/** Rules on what is known rather than on what is done: no quantity of the flow clears them. */
const ABOUT_DATA = [13, 15];

/**
 * For every rule at every step that is not clear, the smallest change of one quantity that clears it, tried on the full model with all
 * rules, worst finding first. Yields after every candidate, so that it can be left with what it has found or others can have their
 * turn; deterministic, nominal values.
 * @throws EngineInputError when the flow itself cannot be walked
 */
export function* findRemedies(
  flow: FlowInput,
  limits: SiteLimits,
  catalogue: Catalogue,
): Generator<RemedyProgress, { answers: RemedyAnswer[]; trials: number }> {
  const base = walked(flow, limits);
  const findings = judged(base, limits);
  let count = 0;
  const trials: Trials = { base, limits, catalogue, findings, count: () => (count += 1) };
  const groups = notClear(findings);
  const answers: RemedyAnswer[] = [];
  for (const [index, group] of groups.entries()) {
    const progress = { done: index, of: groups.length, answers };
    yield progress;
    answers.push(yield* answerFor(trials, group, progress));
  }
  return { answers, trials: count };
}

/** Findings of one rule at one step belong together; the worst speaks for them. */
function notClear(findings: readonly Finding[]): Finding[] {
  const worst = new Map<string, Finding>();
  for (const finding of findings) {
    const key = `${finding.rule} ${finding.step}`;
    const known = worst.get(key);
    if (finding.outcome !== "clear" && (!known || outcomeRank(finding.outcome) > outcomeRank(known.outcome)))
      worst.set(key, finding);
  }
  return [...worst.values()].sort((a, b) => outcomeRank(b.outcome) - outcomeRank(a.outcome) || a.step - b.step);
}

function* answerFor(
  trials: Trials,
  { rule, step, title, outcome, reason, remedy }: Finding,
  progress: RemedyProgress,
): Generator<RemedyProgress, RemedyAnswer> {
  const place = { rule, step };
  const candidates = ABOUT_DATA.includes(rule) ? [] : candidatesFor(trials.base, rule, step, trials.catalogue);
  const reached: TriedChange[] = [];
  const nearest: TriedChange[] = [];
  const eased: TriedChange[] = [];
  for (const candidate of candidates) {
    const answer = smallestChange(trials, place, candidate, "clear");
    if (answer.reached) reached.push(answer.reached);
    else if (answer.nearest) nearest.push(answer.nearest);
    // What cannot be cleared may still be run with a caution.
    if (!answer.reached && answer.nearest?.standing.outcome === "caution" && blocks(outcome)) {
      const caution = smallestChange(trials, place, candidate, "caution").reached;
      if (caution) eased.push(caution);
    }
    yield progress;
  }
  const remedies: Remedy[] = [];
  for (const { change, standing } of [...smallestFirst(reached), ...smallestFirst(eased)].slice(0, 2 * NAMED + 4)) {
    const found = remedyOf(trials, [change], standing);
    // What bars the flow elsewhere is no remedy.
    if (found && !found.worsens.some((each) => blocks(each.outcome))) remedies.push(found);
    yield progress;
  }
  const single = remedies.sort(byHarm).slice(0, NAMED);
  return {
    ...place,
    title,
    outcome,
    reason,
    says: remedy,
    remedies: single,
    pair: single.length > 0 ? null : closestPair(trials, place, nearest),
    tried: candidates.length,
  };
}

const smallestFirst = (changes: readonly TriedChange[]) => changes.toSorted((a, b) => a.size - b.size);

/** Cleared before eased, then the verdict that is left, then what it harms. */
function byHarm(a: Remedy, b: Remedy): number {
  return (
    outcomeRank(a.standing.outcome) - outcomeRank(b.standing.outcome) ||
    outcomeRank(a.verdict) - outcomeRank(b.verdict) ||
    a.worsens.length - b.worsens.length
  );
}

function remedyOf(trials: Trials, changes: FlowChange[], standing: Standing): Remedy | null {
  const after = findingsAfter(trials, changes);
  if (!after) return null;
  const before = new Map<string, Outcome>();
  for (const { rule, step, outcome } of trials.findings) {
    const key = `${rule} ${step}`;
    const known = before.get(key) ?? "clear";
    before.set(key, outcomeRank(outcome) > outcomeRank(known) ? outcome : known);
  }
  const worsens = after.flatMap(({ finding: { rule, step, outcome, reason }, origin }) =>
    outcomeRank(outcome) > outcomeRank(before.get(`${rule} ${origin ?? "new"}`) ?? "clear")
      ? [{ rule, step, outcome, reason }]
      : [],
  );
  const still = new Set(
    after.flatMap(({ finding, origin }) => (finding.outcome === "clear" ? [] : [`${finding.rule} ${origin ?? "new"}`])),
  );
  const cleared = [...before].filter(([key, outcome]) => outcome !== "clear" && !still.has(key)).length;
  return {
    changes,
    standing,
    verdict: worstOutcome(after.map(({ finding }) => finding)),
    worsens,
    alsoClears: Math.max(0, cleared - 1),
  };
}

/** Of the changes that came nearest, the two that together come closest; null when they do not come closer than one alone. */
function closestPair(trials: Trials, place: Place, nearest: readonly TriedChange[]): Remedy | null {
  const best = nearest.toSorted((a, b) => (better(a.standing, b.standing) ? -1 : 1)).slice(0, PAIRED);
  const [alone] = best;
  if (!alone) return null;
  let closest: { changes: FlowChange[]; standing: Standing } | null = null;
  for (const [index, { change: first }] of best.entries())
    for (const { change: second } of best.slice(index + 1)) {
      if (sameQuantity(first, second)) continue;
      const standing = standingAfter(trials, place, [first, second]);
      if (standing && better(standing, closest?.standing ?? alone.standing))
        closest = { changes: [first, second], standing };
    }
  return closest ? remedyOf(trials, closest.changes, closest.standing) : null;
}

const keyOf = (change: FlowChange) => `${change.quantity} ${change.step} ${"film" in change ? change.film : ""}`;
/** A change that moves steps about leaves the numbers of the other one wrong. */
const renumbers = ({ quantity }: FlowChange) => quantity === "place" || quantity === "frame";
const sameQuantity = (a: FlowChange, b: FlowChange) => keyOf(a) === keyOf(b) || renumbers(a) || renumbers(b);
