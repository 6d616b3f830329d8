import { legQuery } from "./leg-query.ts";

/** Address of a step of an assessment, on the assessment's own page, at the leg that is looked at. */
export function stepPath(step: number, leg: number | string | null = null): string {
  return `?step=${step}${legQuery("&", leg)}#step-${step}`;
}
