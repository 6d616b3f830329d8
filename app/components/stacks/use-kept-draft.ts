import { useEffect, useMemo, useRef, useState } from "react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { draftName, dropDraft, keepDraft, keptDrafts, stillHere, type KeptDraft } from "#app/lib/drafts.ts";

/** Typing rests this long before it is kept, ms. */
const REST = 400;

/** What a stack goes by that is not stored yet. */
export const NEW = "new";

interface Now {
  person: string;
  /** id of the stack, or `NEW` */
  record: string;
  version: number | null;
  /** the stack as it was opened, and as it is said now, as the JSON of its text */
  opened: string;
  said: string;
  /** whether it has just been saved, so that nothing has to be kept */
  saved: boolean;
}

/**
 * Keeps a stack that has been changed and not saved in this browser. `offered` is what an earlier visit has left behind, newest first;
 * `keptAt` says when it was kept last, null while nothing is.
 */
export function useKeptDraft({ person, record, version, opened, said, saved }: Now) {
  const scripted = useInBrowser();
  const own = useRef<string | null>(null);
  const [keptAt, setKeptAt] = useState<string | null>(null);
  const [settled, setSettled] = useState<readonly string[]>([]);
  // What was there when the page was opened: what is typed from now on is not offered back to who types it.
  const found = useMemo(() => (scripted ? keptDrafts(person, record) : []), [scripted, person, record]);
  useEffect(() => {
    // Saved since: as a new stack, or by a window that was closed before it could take its draft away.
    for (const draft of [...found, ...keptDrafts(person, NEW)]) if (draft.said === opened) dropDraft(draft.name);
  }, [found, opened, person]);
  useEffect(() => {
    if (saved || said === opened) {
      if (own.current !== null) dropDraft(own.current);
      return undefined;
    }
    stillHere();
    const timer = window.setTimeout(() => {
      own.current ??= draftName(person, record);
      const at = new Date().toISOString();
      if (keepDraft(own.current, { at, version, opened, said })) setKeptAt(at);
    }, REST);
    return () => window.clearTimeout(timer);
  }, [person, record, version, opened, said, saved]);
  const settle = ({ name }: KeptDraft) => {
    dropDraft(name);
    setSettled([...settled, name]);
  };
  return {
    offered: found.filter(({ name, said: kept }) => !settled.includes(name) && kept !== opened),
    keptAt: said === opened ? null : keptAt,
    settle,
  };
}
