/** Address of a step of an assessment, on the assessment's own page. */
export function stepPath(step: number): string {
  return `?step=${step}#step-${step}`;
}
