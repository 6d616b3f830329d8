import { createHash } from "node:crypto";
import { EngineInputError } from "#app/engine/errors.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { remediesRun } from "#app/lib/remedies-run.ts";
import type { RemediesView } from "#app/lib/remedies-view.ts";
import type { TrialQuestion } from "#app/schemas/trial.ts";
import { inTurns } from "./in-turns.server.ts";

/** How many answers are kept: each is small, and made anew in a second or two. */
const KEPT = 60;

const kept = new Map<string, Promise<RemediesView | null>>();

/**
 * The smallest changes that clear what an assessment found; null when today's engine cannot compute its inputs. The same question
 * is worked out once however many ask it, and lets others have their turn.
 */
export function remediesOf(question: TrialQuestion): Promise<RemediesView | null> {
  const key = createHash("sha256")
    .update(JSON.stringify([ENGINE_VERSION, question]))
    .digest("hex");
  const known = kept.get(key);
  if (known) return known;
  const search = worked(question);
  kept.set(key, search);
  search.catch(() => kept.delete(key));
  const [oldest] = kept.keys();
  if (kept.size > KEPT && oldest !== undefined) kept.delete(oldest);
  return search;
}

async function worked(question: TrialQuestion): Promise<RemediesView | null> {
  try {
    return await inTurns(remediesRun(question));
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}
