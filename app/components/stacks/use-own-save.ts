import { useState } from "react";
import { useLocation, useNavigation } from "react-router";

/** Where a stack that has been saved is shown. */
const STORED = /^\/stacks\/[0-9a-f-]{36}$/;

/**
 * Whether what was sent has just been saved, and how often that has been so: a page that has been saved begins anew, one whose data only
 * came anew keeps what is typed. A busy browser may paint no step of the way, so that where it led counts, not only what was seen of it.
 * @param answer what the form was last answered; another one says that it was refused
 */
export function useOwnSave(answer: unknown): { saved: boolean; saves: number } {
  const { state, formMethod, location } = useNavigation();
  const { key, pathname } = useLocation();
  const [sent, setSent] = useState<{ before: unknown; from: string } | null>(null);
  const [saves, setSaves] = useState(0);
  if (state !== "idle" && formMethod === "POST" && sent === null) setSent({ before: answer, from: key });
  const accepted = sent !== null && sent.before === answer;
  const saved = state === "loading" && formMethod === "POST" && accepted && STORED.test(location.pathname);
  if (state === "idle" && sent !== null) {
    setSent(null);
    if (accepted && key !== sent.from && STORED.test(pathname)) setSaves(saves + 1);
  }
  return { saved, saves };
}
