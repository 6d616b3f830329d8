import { useCallback, useEffect, useRef, useState } from "react";
import type { WarpQuestion, WarpSpread } from "#app/lib/warp-sampling.ts";
import type { WarpSamplingMessage } from "#app/lib/warp-sampling-worker.ts";

export type SamplingState =
  | { kind: "idle" }
  | { kind: "running"; done: number; of: number }
  | { kind: "done"; spread: WarpSpread; key: string }
  | { kind: "failed"; why: string };

const BROKEN = "The figures could not be worked out in this browser. Reload the page and try again.";

/** Samples the spread of a warp in a worker of its own, so that typing goes on; one at a time, and it can be stopped. */
export function useWarpSampling() {
  const [state, setState] = useState<SamplingState>({ kind: "idle" });
  const worker = useRef<Worker | null>(null);
  const end = useCallback(() => {
    worker.current?.terminate();
    worker.current = null;
  }, []);
  useEffect(() => end, [end]);
  const stop = useCallback(() => {
    end();
    setState({ kind: "idle" });
  }, [end]);
  const start = useCallback(
    (question: WarpQuestion, key: string) => {
      end();
      setState({ kind: "running", done: 0, of: 1 });
      const started = new Worker(new URL("../../lib/warp-sampling-worker.ts", import.meta.url), { type: "module" });
      worker.current = started;
      started.onmessage = ({ data }: MessageEvent<WarpSamplingMessage>) => {
        if (data.kind === "progress") return setState({ kind: "running", done: data.done, of: data.of });
        end();
        return setState(
          data.kind === "spread" ? { kind: "done", spread: data.spread, key } : { kind: "failed", why: data.why },
        );
      };
      started.onerror = () => {
        end();
        setState({ kind: "failed", why: BROKEN });
      };
      started.postMessage(question);
    },
    [end],
  );
  return { state, start, stop };
}
