import { findRemedies } from "#app/engine/remedy/find-remedies.ts";
import type { TrialQuestion } from "#app/schemas/trial.ts";
import { remediesView, type RemediesView } from "./remedies-view.ts";
import type { Run } from "./worker-run.ts";

/**
 * The smallest changes that clear an assessment, finding after finding, the worst first. The same on the server and in a worker.
 * @throws EngineInputError when today's engine refuses the flow
 */
export function* remediesRun({ flow, limits, catalogue }: TrialQuestion): Run<RemediesView> {
  const search = findRemedies(flow, limits, catalogue);
  for (;;) {
    const next = search.next();
    if (next.done) return remediesView(next.value.answers, { flow, catalogue });
    const { done, of, answers } = next.value;
    yield { done, of, found: () => (answers.length > 0 ? remediesView(answers, { flow, catalogue }) : null) };
  }
}
