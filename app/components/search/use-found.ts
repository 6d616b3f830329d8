import { useEffect, useState } from "react";
import type { SearchAnswer } from "#app/schemas/search.ts";

/** How long a hand may rest between two letters, ms. */
const PAUSE = 150;

/** How a search stands: the newest answer, whether it is of what stands in the field, and why there is none. */
export interface Found {
  answer: SearchAnswer | null;
  waiting: boolean;
  why: string | null;
  again: () => void;
}

interface Settled {
  asked: string;
  attempt: number;
  answer: SearchAnswer | null;
  why: string | null;
}

/**
 * What a search finds while somebody types. It asks by itself and not by a fetcher: what goes wrong with a fetcher takes the place of
 * the whole page, here it is said in the palette.
 */
export function useFound(text: string): Found {
  const asked = text.trim();
  const [attempt, setAttempt] = useState(0);
  const [settled, setSettled] = useState<Settled | null>(null);
  useEffect(() => {
    const leaving = new AbortController();
    const ask = async () => {
      try {
        const answer = await readFound(asked, leaving.signal);
        setSettled({ asked, attempt, answer, why: null });
      } catch (error) {
        if (leaving.signal.aborted) return;
        const why = error instanceof Error ? error.message : "";
        setSettled((was) => ({ asked, attempt, answer: was?.answer ?? null, why }));
      }
    };
    const timer = setTimeout(() => void ask(), asked === "" ? 0 : PAUSE);
    return () => {
      clearTimeout(timer);
      leaving.abort();
    };
  }, [asked, attempt]);
  return {
    answer: settled?.answer ?? null,
    waiting: settled?.asked !== asked || settled.attempt !== attempt,
    why: settled?.why ?? null,
    again: () => setAttempt((number) => number + 1),
  };
}

/** @throws Error with a sentence for the person who searches */
async function readFound(asked: string, signal: AbortSignal): Promise<SearchAnswer> {
  const address = `/search/found?${new URLSearchParams({ q: asked }).toString()}`;
  const response = await fetch(address, { headers: { Accept: "application/json" }, signal }).catch(() => {
    throw new Error("The search did not come through. Check the connection.");
  });
  if (response.redirected) throw new Error("You are signed out. Load the page again and sign in.");
  if (!response.ok) throw new Error("The server could not search just now.");
  return (await response.json()) as SearchAnswer;
}
