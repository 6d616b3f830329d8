import { startTransition, useCallback, useEffect, useMemo, useState } from "react";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { postEstimate } from "#app/lib/post-estimate.ts";
import { panelKey, type PanelRequests, type StackPanel } from "#app/lib/stack-panel.ts";
import type { Estimated } from "#app/lib/stack-words.ts";

/** How long nothing may be typed before it is computed, ms. */
const PAUSE = 120;

/** The engine comes after the page, and only to who types. */
const engine = () => import("#app/lib/live-panel.ts");

const BROKEN = "It could not be worked out here; nothing that you typed is lost.";

interface Live {
  /** the newest complete figures; those of the page until others have come */
  panel: StackPanel | null;
  /** whether they are of something else than what is typed now */
  stale: boolean;
  /** why what is typed now was not worked out, with a way to try again */
  problem: { sentence: string; retry: () => void } | null;
}

/** Keys of what a panel is of, and of what was tried in vain. */
const keyOf = (panel: StackPanel | null) =>
  panel && panelKey({ room: panel.room.request, hot: panel.hot?.request ?? null });

/**
 * The panel of what is being typed, computed here by the server's own code a moment after the last change; while something is
 * missing or being computed the old figures stay, and what was begun before is dropped.
 */
export function useLiveEstimate(wanted: PanelRequests | null, served: StackPanel | null, limits: SiteLimits): Live {
  const [panel, setPanel] = useState(served);
  const [failure, setFailure] = useState<{ key: string; sentence: string } | null>(null);
  const key = useMemo(() => wanted && panelKey(wanted), [wanted]);
  const shown = useMemo(() => keyOf(panel), [panel]);
  const failed = failure !== null && failure.key === key;
  const ask = key !== null && key !== shown && !failed ? key : null;
  useEffect(() => {
    // After the first look into a field has been painted, so that it is there before it is needed; whether it came shows when it is.
    const fetchEngine = () => void setTimeout(() => void engine().catch(() => undefined), PAUSE);
    document.addEventListener("focusin", fetchEngine, { once: true });
    return () => document.removeEventListener("focusin", fetchEngine);
  }, []);
  useEffect(() => {
    if (ask === null) return undefined;
    const controller = new AbortController();
    const timer = setTimeout(() => {
      void compute(JSON.parse(ask) as PanelRequests, limits, controller.signal).then((computed) => {
        if (controller.signal.aborted) return;
        if ("sentence" in computed) setFailure({ key: ask, sentence: computed.sentence });
        else startTransition(() => setPanel(computed));
      });
    }, PAUSE);
    return () => {
      clearTimeout(timer);
      controller.abort();
    };
  }, [ask, limits]);
  const retry = useCallback(() => setFailure(null), []);
  return {
    panel,
    stale: key === null || key !== shown,
    problem: failed ? { sentence: failure.sentence, retry } : null,
  };
}

/** The panel of requests, or the sentence that says why there is none. */
async function compute(
  requests: PanelRequests,
  limits: SiteLimits,
  signal: AbortSignal,
): Promise<StackPanel | { sentence: string }> {
  const loaded = await engine().catch(() => null);
  try {
    return await (loaded ? loaded.livePanel(requests, limits, signal) : askServer(requests, signal));
  } catch (error) {
    if (!loaded || error instanceof loaded.PanelRefused) return { sentence: messageOf(error) };
    if (!signal.aborted) reportError(error);
    return { sentence: BROKEN };
  }
}

/** The server works it out where the engine did not come, as after an update of the server while the page was open. */
async function askServer({ room, hot }: PanelRequests, signal: AbortSignal): Promise<StackPanel> {
  const ask = async (request: PanelRequests["room"]): Promise<Estimated> => ({
    request,
    answer: await postEstimate(request, signal),
  });
  const [roomAnswer, hotAnswer] = await Promise.all([ask(room), hot && ask(hot)]);
  return { room: roomAnswer, hot: hotAnswer };
}

const messageOf = (error: unknown) => (error instanceof Error ? error.message : BROKEN);
