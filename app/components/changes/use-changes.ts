import { useEffect, useEffectEvent } from "react";
import type { StandNow, Watched } from "#app/schemas/changes.ts";

/** Asked so often where the server can't tell by itself, ms. */
const ASKED_AGAIN = 5_000;

/** A page that is left soon need not be told: most are. Until then it is enough to know how things stood when it came, ms. */
const STAYS = 8_000;

/**
 * Hears that a record was changed by somebody else, while the page is to be seen.
 * @param of kinds and ids, 'stack:…'; none listens to nothing
 * @param since changes with what the page shows: from then on, only what comes after it is a change
 * @param own whether the person's own changes count too, and what may have happened while the page was on its way: for what goes on by
 * itself
 */
export function useChanges(
  of: readonly `${Watched}:${string}`[],
  since: string,
  { own: isOwnTold, changed }: { own: boolean; changed: () => void },
): void {
  const told = useEffectEvent(changed);
  const asked = of.join(" ");
  useEffect(() => {
    if (asked === "") return;
    const address = `/changes?${new URLSearchParams(asked.split(" ").map((each) => ["of", each]))}`;
    let known: string | null = null;
    let source: EventSource | null = null;
    let timer: ReturnType<typeof setInterval> | undefined;
    const stands = ({ stand, own }: StandNow) => {
      const isChange = known === null ? isOwnTold : stand !== known && (isOwnTold || !own);
      known = stand;
      if (isChange) told();
    };
    const askNow = async () => {
      const answer = await fetch(`${address}&once`, { redirect: "manual" }).catch(() => null);
      if (answer?.ok) stands((await answer.json()) as StandNow);
      // Signed out, or the record is gone: asking on tells nothing. A server that can't be reached may come back.
      else if (answer && answer.status < 500) end();
    };
    const listen = () => {
      source = new EventSource(address);
      source.onmessage = ({ data }) => stands(JSON.parse(String(data)) as StandNow);
      source.onerror = () => {
        // A connection that broke is made again by the browser; one that was refused is not.
        if (source?.readyState !== EventSource.CLOSED) return;
        source = null;
        timer ??= setInterval(() => void askNow(), ASKED_AGAIN);
      };
    };
    let waiting: ReturnType<typeof setTimeout> | undefined;
    const begin = () => {
      if (document.hidden || source || timer || waiting) return;
      if (isOwnTold) return listen();
      void askNow();
      waiting = setTimeout(listen, STAYS);
    };
    const end = () => {
      source?.close();
      source = null;
      clearInterval(timer);
      clearTimeout(waiting);
      timer = waiting = undefined;
    };
    const seen = () => (document.hidden ? end() : begin());
    begin();
    document.addEventListener("visibilitychange", seen);
    return () => {
      document.removeEventListener("visibilitychange", seen);
      end();
    };
  }, [asked, since, isOwnTold]);
}
