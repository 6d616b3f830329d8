import { slotsInWords } from "#app/engine/flow/legs.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { sentenceCase } from "./assessment-steps.ts";

/** A leg of an assessment whose flow parts by slot, for the list of legs. */
export interface LegRow {
  /** counts from 1, by the first slot */
  number: number;
  /** 'slots 1 to 12' */
  slots: string;
  /** the same to begin with: 'Slots 1 to 12' */
  name: string;
  outcome: Outcome;
  /** 'first at step 4'; null when it is clear */
  where: string | null;
}

/** The legs of an assessment and the one that is looked at. */
export interface LegsView {
  chosen: LegRow;
  rows: LegRow[];
}

/** What an assessment says of one of its legs. */
export interface LegAnswer {
  result: AssessmentResult;
  /** null where the flow does not part by slot */
  legs: LegsView | null;
}

/** What an assessment says of the leg that an address asks for, by its number; of the worst when it asks for none that there is. */
export function legAnswer(whole: AssessmentResult, asked: string | null): LegAnswer {
  const { legs = [] } = whole;
  const rows = legs.map(({ slots, verdict }, index): LegRow => ({
    number: index + 1,
    slots: slotsInWords(slots),
    name: sentenceCase(slotsInWords(slots)),
    outcome: verdict.outcome,
    where: verdict.step === null ? null : `first at step ${verdict.step}`,
  }));
  const number = legNumber(whole, asked);
  const chosen = rows.find((row) => row.number === number);
  if (!chosen) return { result: whole, legs: null };
  return { result: legs[chosen.number - 1]?.result ?? whole, legs: { chosen, rows } };
}

/** Number of the leg that an address asks for, else of the worst; null where the flow does not part by slot. */
export function legNumber({ legs = [] }: Pick<AssessmentResult, "legs">, asked: string | null): number | null {
  if (legs.length === 0) return null;
  const found = asked !== null && /^\d{1,2}$/.test(asked) ? Number(asked) : 0;
  return found >= 1 && found <= legs.length ? found : legs.findIndex(({ result }) => result === null) + 1;
}
