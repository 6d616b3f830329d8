import type { ReactNode } from "react";
import { count, RunProgress } from "./RunProgress.tsx";
import type { RunState } from "./use-worker-run.ts";

interface Props {
  state: RunState<unknown>;
  /** what is counted, as the name of the bar and as a noun: 'Findings looked into', 'findings' */
  label: string;
  noun: string;
  /** what is said once it is done; nothing then and no button without it */
  done?: string;
  /** what the button says that begins; nothing where it begins by itself */
  begin?: string;
  onStart: () => void;
  onStop: () => void;
  /** another way to the answer, for when it cannot be worked out here */
  otherwise?: ReactNode;
}

/** Progress of a run in a worker with its one button: it begins, stops and begins again. */
export function RunBar({ state, label, noun, done, begin, onStart, onStop, otherwise }: Props) {
  const running = state.kind === "running";
  const said = saidOf(state, noun, done);
  const name = running ? "Stop" : state.kind === "idle" ? begin : "Start again";
  if (state.kind === "done" && said === null) return null;
  return (
    <div className="screen-only flex flex-wrap items-center gap-x-4 gap-y-2">
      {running ? <RunProgress done={state.done} of={state.of} label={label} /> : null}
      <p role="status" className={said === null ? "sr-only" : state.kind === "failed" ? "text-stop" : "text-quiet"}>
        {said}
        {state.kind === "failed" && otherwise ? <> {otherwise}</> : null}
      </p>
      {name ? (
        <button type="button" className="btn" onClick={running ? onStop : onStart}>
          {name}
        </button>
      ) : null}
    </div>
  );
}

function saidOf(state: RunState<unknown>, noun: string, done: string | undefined): string | null {
  switch (state.kind) {
    case "stopped":
      return state.of === 0
        ? "Stopped before it began."
        : `Stopped at ${count(state.done)} of ${count(state.of)} ${noun}.`;
    case "done":
      return done ?? null;
    case "failed":
      return state.why;
    default:
      return null;
  }
}
