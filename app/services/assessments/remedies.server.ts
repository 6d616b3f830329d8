import { createHash } from "node:crypto";
import { EngineInputError } from "#app/engine/errors.ts";
import { findRemedies, type RemedyAnswer } from "#app/engine/remedy/find-remedies.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import { inTurns } from "./in-turns.server.ts";
import type { TrialGround } from "./trial-ground.server.ts";

/** How many answers are kept: each is small, and made anew in a second or two. */
const KEPT = 60;

const kept = new Map<string, Promise<RemedyAnswer[] | null>>();

/**
 * The smallest changes that clear what an assessment found; null when today's engine cannot compute its inputs. The same question
 * is worked out once however many ask it, and lets others have their turn.
 */
export function remediesOf({ input, catalogue }: TrialGround): Promise<RemedyAnswer[] | null> {
  const key = createHash("sha256")
    .update(JSON.stringify([ENGINE_VERSION, input, catalogue]))
    .digest("hex");
  const known = kept.get(key);
  if (known) return known;
  const search = worked(input, catalogue);
  kept.set(key, search);
  search.catch(() => kept.delete(key));
  const [oldest] = kept.keys();
  if (kept.size > KEPT && oldest !== undefined) kept.delete(oldest);
  return search;
}

async function worked({ flow, limits }: AssessmentInput, catalogue: Catalogue): Promise<RemedyAnswer[] | null> {
  try {
    const { answers } = await inTurns(findRemedies(flow, limits, catalogue));
    return answers;
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}
