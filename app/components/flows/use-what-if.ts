import { useEffect, useMemo, useState } from "react";
import { placeOf } from "#app/lib/what-if.ts";
import type { WhatIfChange } from "#app/schemas/what-if.ts";
import { useWhatIfWorker } from "./use-what-if-worker.ts";

/** How long nothing may be typed before it is computed, ms: a figure of several digits is one question. */
const PAUSE = 100;

/**
 * A what-if: changes held, the one that is being typed, and the answer to all of them a moment after the last key. While that is on its
 * way, or what is typed is not understood, the old answer stays and is marked.
 */
export function useWhatIf(flowId: string) {
  const { loaded, failed, answered, ask, forget } = useWhatIfWorker(flowId);
  const [held, setHeld] = useState<WhatIfChange[]>([]);
  const [typed, setTyped] = useState<WhatIfChange | null>(null);
  const changes = useMemo(() => {
    const others = typed ? held.filter((change) => placeOf(change) !== placeOf(typed)) : held;
    return typed ? [...others, typed] : others;
  }, [held, typed]);
  const key = JSON.stringify(changes);
  useEffect(() => {
    if (!loaded) return undefined;
    if (key === "[]") {
      forget();
      return undefined;
    }
    const timer = setTimeout(() => ask(key, JSON.parse(key) as WhatIfChange[]), PAUSE);
    return () => clearTimeout(timer);
  }, [loaded, key, ask, forget]);
  return {
    loaded,
    failed,
    changes,
    /** takes the change that is typed into those that are held, so that another can be tried with it */
    hold: () => {
      setHeld(changes);
      setTyped(null);
    },
    drop: (change: WhatIfChange) => {
      setHeld(held.filter((each) => placeOf(each) !== placeOf(change)));
      if (typed && placeOf(typed) === placeOf(change)) setTyped(null);
    },
    putBack: () => {
      setHeld([]);
      setTyped(null);
    },
    type: setTyped,
    typed,
    answer: changes.length > 0 ? (answered?.answer ?? null) : null,
    stale: answered?.key !== key,
  };
}
