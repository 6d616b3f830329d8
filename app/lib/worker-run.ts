import { EngineInputError } from "#app/engine/errors.ts";

/** How far a run is. `found` tells what it has found until now, for whoever leaves it here; nothing when it is not asked. */
export interface RunProgress<Found> {
  done: number;
  of: number;
  found?: () => Found | null;
}

/** A search or a sampling in small pieces. Leaving it early is safe, so a worker can stop it. */
export type Run<Found> = Generator<RunProgress<Found>, Found, void>;

/** What a worker says: how far it is with what it has found, what came out, or what stood in the way. */
export type RunMessage<Found> =
  | { kind: "progress"; done: number; of: number; found: Found | null }
  | { kind: "done"; found: Found }
  | { kind: "refused"; why: string };

/** How often progress is told at most, ms. */
const TOLD_EVERY = 60;

/** Takes a run to its end in a worker and tells how it goes. */
export function tellRun<Found>(run: Run<Found>, say: (message: RunMessage<Found>) => void): void {
  let told = -Infinity;
  try {
    for (;;) {
      const next = run.next();
      if (next.done) return say({ kind: "done", found: next.value });
      const now = performance.now();
      if (now - told < TOLD_EVERY) continue;
      told = now;
      const { done, of, found } = next.value;
      say({ kind: "progress", done, of, found: found?.() ?? null });
    }
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return say({ kind: "refused", why: refusalWords(error) });
  }
}

/** A refusal of the engine as sentences. */
export const refusalWords = (error: EngineInputError) => `This cannot be computed. ${refusalReason(error)}`;

/** Why the engine refuses, and at which step of a flow. */
export function refusalReason({ field, reason }: EngineInputError): string {
  const step = /^steps\[(\d+)\]/.exec(field)?.[1];
  const place = step === undefined ? "" : `Step ${Number(step) + 1}: `;
  return `${place}${reason}.`;
}
