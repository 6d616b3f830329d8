/** What an address needs to stay with a leg, after the mark that is handed in; nothing where there are no legs. */
export function legQuery(mark: "?" | "&" | "", leg: number | string | null | undefined): string {
  return leg === null || leg === undefined || leg === "" ? "" : `${mark}leg=${encodeURIComponent(leg)}`;
}

/** Address of an assessment at the leg that is tried on, and there at a step. */
export function trialHome(
  { id, leg }: { id: string; leg: { number: number } | null },
  step: number | null = null,
): string {
  const at = step === null ? "" : `?step=${step}`;
  return `/assessments/${id}${at}${legQuery(step === null ? "?" : "&", leg?.number)}`;
}

/** Where the browser reads what it tries changes on. */
export function trialPath(assessmentId: string, leg: number | string | null | undefined): string {
  return `/assessments/${assessmentId}/trial${legQuery("?", leg)}`;
}
