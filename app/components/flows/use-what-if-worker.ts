import { useCallback, useEffect, useRef, useState } from "react";
import { latestWins } from "#app/lib/latest-wins.ts";
import { readSent } from "#app/lib/read-sent.ts";
import type { ToldAnswer } from "#app/lib/what-if-answer.ts";
import type { WhatIfAsked, WhatIfTold } from "#app/lib/what-if-worker.ts";
import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";

export interface WhatIfLoaded {
  snapshot: WhatIfSnapshot;
  present: ToldAnswer;
}

type Question = Extract<WhatIfAsked, { key: string }>;

/**
 * A flow and the engine in a worker, which assesses changes of it one after the other; of those that come while it is busy it takes the
 * latest only. `failed` says why there is nothing, in a sentence.
 */
export function useWhatIfWorker(flowId: string) {
  const [loaded, setLoaded] = useState<WhatIfLoaded | null>(null);
  const [failed, setFailed] = useState<string | null>(null);
  const [answered, setAnswered] = useState<{ key: string; answer: ToldAnswer } | null>(null);
  const queue = useRef<ReturnType<typeof latestWins<Question>> | null>(null);

  useEffect(() => {
    let over = false;
    let worker: Worker | null = null;
    const fail = (why: string) => {
      worker?.terminate();
      queue.current = null;
      if (!over) setFailed(why);
    };
    const begin = (snapshot: WhatIfSnapshot) => {
      if (over) return;
      const engine = startWorker();
      if (!engine) return fail(BROKEN);
      worker = engine;
      const post = (asked: WhatIfAsked) => engine.postMessage(asked);
      const own = latestWins<Question>(post);
      engine.onerror = () => fail(BROKEN);
      engine.onmessage = ({ data: { key, answer } }: MessageEvent<WhatIfTold>) => {
        if (key === null) {
          queue.current = own;
          return setLoaded({ snapshot, present: answer });
        }
        if (own.answered(key)) setAnswered({ key, answer });
      };
      post({ snapshot });
    };
    readSent<WhatIfSnapshot>(`/flows/${flowId}/what-if`).then(begin, () => fail(UNREAD));
    return () => {
      over = true;
      worker?.terminate();
      queue.current = null;
    };
  }, [flowId]);

  const ask = useCallback((key: string, changes: WhatIfChange[]) => queue.current?.ask({ key, changes }), []);
  const forget = useCallback(() => queue.current?.forget(), []);
  return { loaded, failed, answered, ask, forget };
}

const UNREAD = "The flow could not be read. Close this part and open it again.";
const BROKEN =
  "The engine does not run in this browser, so nothing can be tried here. Change the flow and assess it instead.";

function startWorker(): Worker | null {
  try {
    return new Worker(new URL("../../lib/what-if-worker.ts", import.meta.url), { type: "module" });
  } catch {
    return null;
  }
}
