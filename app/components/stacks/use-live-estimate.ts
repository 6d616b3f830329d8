import { useCallback, useEffect, useState } from "react";
import { postEstimate } from "#app/lib/post-estimate.ts";
import { panelKey, type PanelRequests, type StackPanel } from "#app/lib/stack-panel.ts";
import type { Estimated } from "#app/lib/stack-words.ts";

/** How long nothing may be typed before the server is asked, ms. */
const PAUSE = 120;

interface Live {
  /** the newest complete figures; those of the page until others have come */
  panel: StackPanel | null;
  /** whether they are of something else than what is typed now */
  stale: boolean;
  /** why the newest request was not answered, with a way to ask again */
  problem: { sentence: string; retry: () => void } | null;
}

/** Keys of what a panel is of, and of what was asked in vain. */
const keyOf = (panel: StackPanel | null) =>
  panel && panelKey({ room: panel.room.request, hot: panel.hot?.request ?? null });

/**
 * The panel of what is being typed. Asks the server a moment after the last change and drops what was asked before; while
 * something is missing or on its way the old figures stay.
 */
export function useLiveEstimate(wanted: PanelRequests | null, served: StackPanel | null): Live {
  const [panel, setPanel] = useState(served);
  const [failure, setFailure] = useState<{ key: string; sentence: string } | null>(null);
  const key = wanted && panelKey(wanted);
  const shown = keyOf(panel);
  const failed = failure !== null && failure.key === key;
  const ask = key !== null && key !== shown && !failed ? key : null;
  useEffect(() => {
    if (ask === null) return undefined;
    const controller = new AbortController();
    const timer = setTimeout(() => {
      estimates(JSON.parse(ask) as PanelRequests, controller.signal).then(
        (answered) => {
          if (!controller.signal.aborted) setPanel(answered);
        },
        (error: unknown) => {
          if (!controller.signal.aborted) setFailure({ key: ask, sentence: sentenceOf(error) });
        },
      );
    }, PAUSE);
    return () => {
      clearTimeout(timer);
      controller.abort();
    };
  }, [ask]);
  const retry = useCallback(() => setFailure(null), []);
  return {
    panel,
    stale: key === null || key !== shown,
    problem: failed ? { sentence: failure.sentence, retry } : null,
  };
}

async function estimates({ room, hot }: PanelRequests, signal: AbortSignal): Promise<StackPanel> {
  const ask = async (request: PanelRequests["room"]): Promise<Estimated> => ({
    request,
    answer: await postEstimate(request, signal),
  });
  const [roomAnswer, hotAnswer] = await Promise.all([ask(room), hot && ask(hot)]);
  return { room: roomAnswer, hot: hotAnswer };
}

const sentenceOf = (error: unknown) => (error instanceof Error ? error.message : "The estimate did not come.");
