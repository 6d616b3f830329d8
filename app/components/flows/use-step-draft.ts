import { parse } from "@conform-to/react";
import { useEffect, useMemo, useRef, useState, type RefObject } from "react";
import { useLocation, useNavigation } from "react-router";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { StepFormValues } from "./step-form-values.ts";

interface Draft {
  /** ISO 8601 */
  at: string;
  entries: [name: string, value: string][];
}

/** Typing rests this long before it is put aside, ms. */
const REST = 400;

function readDraft(key: string): Draft | null {
  try {
    const text = sessionStorage.getItem(key);
    return text === null ? null : (JSON.parse(text) as Draft);
  } catch {
    return null;
  }
}

function entriesOf(form: HTMLFormElement): Draft["entries"] {
  return [...new FormData(form)].flatMap(([name, value]): Draft["entries"] =>
    typeof value === "string" && name !== "version" ? [[name, value]] : [],
  );
}

function valuesOf({ entries }: Draft): Partial<StepFormValues> {
  const typed = new FormData();
  for (const [name, value] of entries) typed.append(name, value);
  return parse(typed, { resolve: (value) => ({ value: value as Partial<StepFormValues> }) })
    .payload as Partial<StepFormValues>;
}

/**
 * Keeps what is half typed in this window until it is saved, so that a closed page or a lost connection costs nothing. `offered` is
 * what an earlier visit left behind; null when there is nothing, or once it has been taken or thrown away.
 */
export function useStepDraft(form: RefObject<HTMLFormElement | null>) {
  const { pathname, search } = useLocation();
  const key = `planeward-draft ${pathname} ${new URLSearchParams(search).get("at") ?? ""}`;
  const scripted = useInBrowser();
  const [declined, setDeclined] = useState(false);
  // What was there when the form was opened: what is typed from now on is not offered back to the one who types it.
  const offered = useMemo(() => (scripted && !declined ? readDraft(key) : null), [scripted, declined, key]);
  const timer = useRef<number | undefined>(undefined);
  useEffect(() => () => window.clearTimeout(timer.current), []);

  const forget = () => {
    window.clearTimeout(timer.current);
    setDeclined(true);
    sessionStorage.removeItem(key);
  };

  const { state, formMethod, location } = useNavigation();
  const saved =
    state === "loading" && formMethod === "POST" && `${location.pathname}${location.search}` !== pathname + search;
  useEffect(() => {
    if (!saved) return;
    window.clearTimeout(timer.current);
    sessionStorage.removeItem(key);
  }, [saved, key]);

  const keep = () => {
    window.clearTimeout(timer.current);
    timer.current = window.setTimeout(() => {
      if (!form.current) return;
      const draft: Draft = { at: new Date().toISOString(), entries: entriesOf(form.current) };
      try {
        sessionStorage.setItem(key, JSON.stringify(draft));
      } catch {
        // A full or forbidden store only means that nothing is offered back.
      }
    }, REST);
  };

  return { offered: offered && { at: offered.at, values: () => valuesOf(offered) }, keep, forget };
}
