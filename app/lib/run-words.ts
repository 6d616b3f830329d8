/** Which of several tools runs a step and by which recipe, 'oven 3, recipe PI-5'; null when neither is said. */
export function runWords(run: {
  machine?: string | null | undefined;
  recipe?: string | null | undefined;
}): string | null {
  return [run.machine, run.recipe && `recipe ${run.recipe}`].filter(Boolean).join(", ") || null;
}
