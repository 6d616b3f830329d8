import type { Remedy, RemedyAnswer } from "#app/engine/remedy/find-remedies.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import { outcomeRank, type Outcome } from "#app/engine/vocabulary.ts";
import type { ChangeWords } from "./change-phrase.ts";
import { changeWords } from "./flow-change-words.ts";

/** A finding that a change has to do with. */
export interface PlaceView {
  rule: number;
  step: number;
}

/** One change, or two together, with all that it clears and what else it does. */
export interface RemedyCard {
  /** what is posted to try it */
  posted: string;
  changes: ChangeWords[];
  clears: PlaceView[];
  /** findings that then still are cautions */
  eases: PlaceView[];
  /** verdict of the flow with it */
  verdict: Outcome;
  worsens: (PlaceView & { outcome: Outcome; reason: string })[];
}

/** A finding that no single change clears. */
export interface UnclearedView extends PlaceView {
  title: string;
  outcome: Outcome;
  reason: string;
  says: string | null;
  tried: number;
  pair: RemedyCard | null;
}

export interface RemediesView {
  cards: RemedyCard[];
  uncleared: UnclearedView[];
}

type Named = { flow: Pick<FlowInput, "steps">; catalogue: Catalogue };

/** What was found, by change: one that clears several findings is said once, the one that leaves least to clear first. */
export function remediesView(answers: readonly RemedyAnswer[], named: Named): RemediesView {
  const cards = new Map<string, RemedyCard>();
  for (const answer of answers)
    for (const remedy of answer.remedies) {
      const fresh = cardOf(remedy, named);
      const card = cards.get(fresh.posted) ?? fresh;
      cards.set(card.posted, card);
      (remedy.standing.outcome === "clear" ? card.clears : card.eases).push({ rule: answer.rule, step: answer.step });
    }
  const done = ({ clears, eases }: RemedyCard) => clears.length + eases.length / 2;
  return {
    cards: [...cards.values()].sort(
      (a, b) =>
        outcomeRank(a.verdict) - outcomeRank(b.verdict) || done(b) - done(a) || a.worsens.length - b.worsens.length,
    ),
    uncleared: answers
      .filter(({ remedies }) => remedies.length === 0)
      .map(({ rule, step, title, outcome, reason, says, tried, pair }) => ({
        rule,
        step,
        title,
        outcome,
        reason,
        says,
        tried,
        pair: pair && pairCard(pair, { rule, step }, named),
      })),
  };
}

function cardOf({ changes, verdict, worsens }: Remedy, { flow, catalogue }: Named): RemedyCard {
  return {
    posted: JSON.stringify(changes),
    changes: changes.map((change) => changeWords(change, flow, catalogue)),
    clears: [],
    eases: [],
    verdict,
    worsens,
  };
}

function pairCard(pair: Remedy, place: PlaceView, named: Named): RemedyCard {
  const card = cardOf(pair, named);
  const { outcome } = pair.standing;
  if (outcome === "clear") card.clears.push(place);
  if (outcome === "caution") card.eases.push(place);
  return card;
}
