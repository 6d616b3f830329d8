import { useCallback } from "react";
import { useWorkerRun, type RunState } from "#app/components/ui/use-worker-run.ts";
import type { FlowQuestion } from "#app/lib/flow-worker.ts";

const make = () => new Worker(new URL("../../lib/flow-worker.ts", import.meta.url), { type: "module" });

type Question = FlowQuestion["question"];

/**
 * One task of the engine on an assessed flow, in a worker of its own.
 * @param begin where it stands before anything is begun
 */
export function useFlowRun<Found>(task: FlowQuestion["task"], begin?: RunState<Found>) {
  const { state, start, stop } = useWorkerRun<FlowQuestion, Found>(make, begin);
  const run = useCallback(
    (question: Question | Promise<Question>) =>
      start(Promise.resolve(question).then((known) => ({ task, question: known }) as FlowQuestion)),
    [start, task],
  );
  return { state, run, stop };
}
