import { useState } from "react";
import { useLocation, useNavigation } from "react-router";

/** Where a stack that has been saved is shown. */
const STORED = /^\/stacks\/[0-9a-f-]{36}$/;

/**
 * Whether what was sent has just been saved, and how often that has been so: a page that has been saved begins anew, one whose data only
 * came anew keeps what is typed. A busy browser may paint only a part of the way, so that what counts is how it stood before anything
 * was under way and where it led.
 * @param answer what the form was last answered; another one says that it was refused
 */
export function useOwnSave(answer: unknown): { saved: boolean; saves: number } {
  const { state, formMethod, location } = useNavigation();
  const { key, pathname } = useLocation();
  const [rest, setRest] = useState({ answer, key });
  const [sent, setSent] = useState(false);
  const [saves, setSaves] = useState(0);
  if (state !== "idle" && formMethod === "POST" && !sent) setSent(true);
  const accepted = sent && rest.answer === answer;
  const saved = state === "loading" && formMethod === "POST" && accepted && STORED.test(location.pathname);
  if (state === "idle" && (sent || rest.answer !== answer || rest.key !== key)) {
    setSent(false);
    setRest({ answer, key });
    if (accepted && key !== rest.key && STORED.test(pathname)) setSaves(saves + 1);
  }
  return { saved, saves };
}
