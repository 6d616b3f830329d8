import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import { incompleteBeta } from "./incomplete-beta.ts";

/** Most trials that are told apart from endless ones. */
const MOST = 1e9;

/** A share with the interval that holds it. */
export interface ShareInterval {
  share: number;
  low: number;
  high: number;
}

/**
 * Share of trials in which something happened, with the interval of Clopper and Pearson: it holds the true share in at least
 * `confidence` of cases, whatever that share is, as long as the trials are independent of each other. Exact but for rounding (1e-12).
 * Source: 'clopper-pearson-1934'.
 * @param events how often it happened, 0 to `trials`
 * @param trials at least 1
 * @throws EngineInputError for counts that are none
 */
export function binomialInterval(events: number, trials: number, confidence = 0.95): ShareInterval {
  requireWithin("confidence", confidence, 0.5, 0.9999, "1");
  requireWithin("trials", trials, 1, MOST, "1");
  requireWithin("events", events, 0, trials, "1");
  if (!Number.isInteger(events) || !Number.isInteger(trials)) throw new EngineInputError("events", "is no count");
  const tail = (1 - confidence) / 2;
  return {
    share: events / trials,
    low: events === 0 ? 0 : shareAt(tail, events, trials - events + 1),
    high: events === trials ? 1 : shareAt(1 - tail, events + 1, trials - events),
  };
}

/** Where the beta distribution of `a` and `b` has reached `probability`, by halving. */
function shareAt(probability: number, a: number, b: number): number {
  let [low, high] = [0, 1];
  for (let n = 0; n < 60; n += 1) {
    const middle = (low + high) / 2;
    if (incompleteBeta(a, b, middle) < probability) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
