import { useEffect, useMemo, useState } from "react";
import { changedInput, placeOf } from "#app/lib/what-if.ts";
import { answerOf, type Answer } from "#app/lib/what-if-answer.ts";
import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";

/** How long nothing may be typed before it is computed, ms. */
const PAUSE = 150;

type Loaded = { snapshot: WhatIfSnapshot; present: Answer };

/** The flow as the server would assess it, with its answer; asked for once. */
function useSnapshot(flowId: string) {
  const [loaded, setLoaded] = useState<Loaded | null>(null);
  const [failed, setFailed] = useState(false);
  useEffect(() => {
    const controller = new AbortController();
    fetch(`/flows/${flowId}/what-if`, { signal: controller.signal, headers: { Accept: "application/json" } })
      .then(async (response) => {
        if (!response.ok) throw new Error(`status ${response.status}`);
        const snapshot = (await response.json()) as WhatIfSnapshot;
        setLoaded({ snapshot, present: answerOf(snapshot.input, snapshot.limits) });
      })
      .catch(() => {
        if (!controller.signal.aborted) setFailed(true);
      });
    return () => controller.abort();
  }, [flowId]);
  return { loaded, failed };
}

/**
 * A what-if: changes held, the one that is being typed, and the answer to all of them a moment after the last key. While that is on its
 * way, or what is typed is not understood, the old answer stays and is marked.
 */
export function useWhatIf(flowId: string) {
  const { loaded, failed } = useSnapshot(flowId);
  const [held, setHeld] = useState<WhatIfChange[]>([]);
  const [typed, setTyped] = useState<WhatIfChange | null>(null);
  const changes = useMemo(() => {
    const others = typed ? held.filter((change) => placeOf(change) !== placeOf(typed)) : held;
    return typed ? [...others, typed] : others;
  }, [held, typed]);
  const key = JSON.stringify(changes);
  const [answered, setAnswered] = useState<{ key: string; answer: Answer } | null>(null);
  useEffect(() => {
    if (!loaded || key === "[]") return undefined;
    const timer = setTimeout(() => {
      const { snapshot } = loaded;
      const input = changedInput(snapshot, JSON.parse(key) as WhatIfChange[]);
      setAnswered({ key, answer: answerOf(input, snapshot.limits) });
    }, PAUSE);
    return () => clearTimeout(timer);
  }, [loaded, key]);
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
