import type { ChangeReach, TouchedFlow } from "#app/schemas/change-request.ts";
import { count } from "./count-words.ts";

/** Whether a flow's verdict would be another. */
export function verdictChanges({ movement }: Pick<TouchedFlow, "movement">): boolean {
  return movement.outcome === "not computable" || movement.before.outcome !== movement.after.outcome;
}

/** 'It touches two of seven flows. The verdict changes in one.' */
export function reachSentence({ flows, touched, more }: ChangeReach): string {
  const all = touched.length + more;
  if (flows === 0) return "There are no flows to look at yet.";
  if (all === 0)
    return flows === 1
      ? "It touches nothing: the one flow does not use it."
      : `It touches none of ${count(flows)} flows.`;
  const changing = touched.filter(verdictChanges).length;
  const verdicts =
    changing === 0
      ? `No verdict changes${more > 0 ? " among those computed" : ""}.`
      : `The verdict changes in ${changing === touched.length && more === 0 ? (changing === 1 ? "it" : "all of them") : count(changing)}.`;
  return `It touches ${flows === 1 ? "the one flow" : `${count(all)} of ${count(flows)} flows`}. ${verdicts}`;
}
