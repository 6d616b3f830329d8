import { EngineInputError } from "#app/engine/errors.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { changedBy } from "#app/engine/remedy/try-change.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { changePhrase } from "#app/lib/change-phrase.ts";
import { changeWords } from "#app/lib/flow-change-words.ts";
import { placeOfText } from "#app/lib/tried-path.ts";
import { triedView, type TriedPageData } from "#app/lib/tried-view.ts";
import { readFlowChanges } from "#app/schemas/flow-change.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { trialGround, trialHead } from "./trial-ground.server.ts";

/**
 * The figures behind a change that was tried on an assessed flow: both flows assessed in full by today's engine, with workings.
 * @throws 400 for changes that no page of ours names, 404 for one of what is not there, 409 where the engine refuses
 */
export async function triedOf(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams,
): Promise<TriedPageData> {
  const ground = await trialGround(scope, assessmentId, search);
  const { flow, limits } = ground.input;
  const posted = search.get("changes") ?? "";
  const changes = readFlowChanges(posted);
  if (!changes)
    throw problem(400, "This address names no change that can be tried. Open the assessment and choose one.");
  const changed = changedBy(flow, changes, ground.catalogue);
  if (changed.flow === flow) throw problem(404, "This change is of something that is not there any more.");
  try {
    const [before, after] = [assessFlow(flow, limits), assessFlow(changed.flow, limits)];
    return {
      head: trialHead(ground),
      engineVersion: ENGINE_VERSION,
      posted,
      changes: changes.map((change) => changePhrase(changeWords(change, flow, ground.catalogue))),
      verdict: { before: before.verdict.outcome, after: after.verdict.outcome },
      view: triedView(before.findings, after.findings, changed.origins, placeOfText(search.get("at"))),
    };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    throw problem(409, `With this change the flow cannot be computed: ${error.reason}.`);
  }
}
