import { useState } from "react";
import { useNavigation } from "react-router";

/** Where a stack that has been saved is shown. */
const STORED = /^\/stacks\/[0-9a-f-]{36}$/;

/**
 * Whether what was sent has just been saved, and how often that has been so: a page that has been saved begins anew, one whose data only
 * came anew keeps what is typed.
 * @param answer what the form was last answered; another one says that it was refused
 */
export function useOwnSave(answer: unknown): { saved: boolean; saves: number } {
  const { state, formMethod, location } = useNavigation();
  const [sent, setSent] = useState<{ before: unknown } | null>(null);
  const [saves, setSaves] = useState(0);
  if (state === "submitting" && formMethod === "POST" && sent === null) setSent({ before: answer });
  const saved =
    state === "loading" &&
    formMethod === "POST" &&
    sent !== null &&
    sent.before === answer &&
    STORED.test(location.pathname);
  const [seen, setSeen] = useState(false);
  if (saved && !seen) setSeen(true);
  if (state === "idle" && sent !== null) {
    setSent(null);
    setSeen(false);
    if (seen) setSaves(saves + 1);
  }
  return { saved, saves };
}
