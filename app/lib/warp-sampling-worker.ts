import { warpSampling, type WarpQuestion, type WarpSpread } from "./warp-sampling.ts";
import { tellRun } from "./worker-run.ts";

/** Answers one question; whoever asked ends the worker to stop it. */
globalThis.addEventListener("message", ({ data }: MessageEvent<WarpQuestion>) => {
  tellRun<WarpSpread>(warpSampling(data), (message) => globalThis.postMessage(message));
});
