import { useCallback, useEffect, useRef, useState } from "react";
import type { RunMessage } from "#app/lib/worker-run.ts";

/** How a run in a worker stands, with what it has found until now; null while that is nothing. */
export type RunState<Found> =
  | { kind: "idle"; found: null }
  | { kind: "running" | "stopped"; done: number; of: number; found: Found | null }
  | { kind: "done"; found: Found }
  | { kind: "failed"; why: string; found: Found | null };

const IDLE = { kind: "idle", found: null } as const;
const BROKEN = "The figures could not be worked out in this browser.";
const UNREAD = "The inputs could not be read.";

/**
 * Runs one question at a time in a worker of its own, so that the page stays free. Stopping ends the worker at once and leaves what it
 * has told. The question may still be on its way when the run is started.
 * @param make starts the worker; a function that stays the same
 */
export function useWorkerRun<Question, Found>(make: () => Worker, begin: RunState<Found> = IDLE) {
  const [state, setState] = useState<RunState<Found>>(begin);
  const running = useRef<{ end: () => void } | null>(null);
  const end = useCallback(() => {
    running.current?.end();
    running.current = null;
  }, []);
  useEffect(() => end, [end]);

  const start = useCallback(
    (asked: Question | Promise<Question>) => {
      end();
      let worker: Worker | null = null;
      const own = {
        end: () => {
          worker?.terminate();
        },
      };
      running.current = own;
      const current = () => running.current === own;
      const fail = (why: string) => {
        if (!current()) return;
        end();
        setState(({ found }) => ({ kind: "failed", why, found }));
      };
      const hear = ({ data }: MessageEvent<RunMessage<Found>>) => {
        if (!current()) return;
        if (data.kind === "refused") return fail(data.why);
        if (data.kind === "progress")
          return setState(({ found }) => ({ ...data, kind: "running", found: data.found ?? found }));
        end();
        return setState(data);
      };
      setState({ kind: "running", done: 0, of: 0, found: null });
      Promise.resolve(asked).then(
        (question) => {
          if (!current()) return;
          try {
            worker = make();
          } catch {
            return fail(BROKEN);
          }
          worker.onmessage = hear;
          worker.onerror = () => fail(BROKEN);
          worker.onmessageerror = () => fail(BROKEN);
          worker.postMessage(question);
        },
        () => fail(UNREAD),
      );
    },
    [end, make],
  );

  const stop = useCallback(() => {
    end();
    setState((was) => (was.kind === "running" ? { ...was, kind: "stopped" } : was));
  }, [end]);
  return { state, start, stop };
}
