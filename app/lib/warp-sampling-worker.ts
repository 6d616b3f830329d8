import { EngineInputError } from "#app/engine/errors.ts";
import { warpSampling, type WarpQuestion, type WarpSpread } from "./warp-sampling.ts";

/** What the worker says: how far it is, what came out, or what stood in the way. */
export type WarpSamplingMessage =
  | { kind: "progress"; done: number; of: number }
  | { kind: "spread"; spread: WarpSpread }
  | { kind: "refused"; why: string };

const say = (message: WarpSamplingMessage) => globalThis.postMessage(message);

/** Answers one question; whoever asked ends the worker to stop it. */
globalThis.addEventListener("message", ({ data }: MessageEvent<WarpQuestion>) => {
  try {
    const run = warpSampling(data);
    for (;;) {
      const step = run.next();
      if (step.done) return say({ kind: "spread", spread: step.value });
      say({ kind: "progress", ...step.value });
    }
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return say({ kind: "refused", why: error.message });
  }
});
