import type { PlaceView } from "./remedies-view.ts";

/**
 * Address of the figures behind a change that was tried, before and after.
 * @param posted the change, as it is posted to try it on a copy
 * @param at the finding whose working is shown; the worst that the change moves when it is not said
 */
export function triedPath(
  { id, leg }: { id: string; leg: { number: number } | null },
  posted: string,
  at: PlaceView | null = null,
): string {
  const search = new URLSearchParams({ changes: posted });
  if (leg) search.set("leg", `${leg.number}`);
  if (at) search.set("at", `${at.step}.${at.rule}`);
  return `/assessments/${id}/tried?${search.toString()}`;
}

/** The step and rule that an address names; null for anything else. */
export function placeOfText(text: string | null): PlaceView | null {
  const [, step, rule] = /^(\d{1,3})\.(\d{1,2})$/.exec(text ?? "") ?? [];
  return step && rule ? { step: Number(step), rule: Number(rule) } : null;
}
