import { useCallback, useState } from "react";
import { useWorkerRun } from "#app/components/ui/use-worker-run.ts";
import type { WarpQuestion, WarpSpread } from "#app/lib/warp-sampling.ts";

const make = () => new Worker(new URL("../../lib/warp-sampling-worker.ts", import.meta.url), { type: "module" });

/** Samples the spread of a warp in a worker of its own. `key` is that of the question which the state answers. */
export function useWarpSampling() {
  const { state, start, stop } = useWorkerRun<WarpQuestion, WarpSpread>(make);
  const [key, setKey] = useState("");
  const ask = useCallback(
    (question: WarpQuestion, asked: string) => {
      setKey(asked);
      start(question);
    },
    [start],
  );
  return { state, key, start: ask, stop };
}
