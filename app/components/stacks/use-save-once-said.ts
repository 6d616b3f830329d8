import { useCallback, useEffect, useRef } from "react";
import { STACK_FORM } from "./stack-fields.ts";

/**
 * Saves the stack as soon as its form says what has been put into it: the fields follow a change by a moment.
 * @param said the stack as it is said now, as the JSON of its text
 * @returns what takes the text that is to be saved, once
 */
export function useSaveOnceSaid(said: string): (text: string) => void {
  const awaited = useRef<string | null>(null);
  useEffect(() => {
    if (awaited.current !== said) return;
    awaited.current = null;
    const form = document.getElementById(STACK_FORM);
    if (form instanceof HTMLFormElement) form.requestSubmit();
  });
  return useCallback((text) => {
    awaited.current = text;
  }, []);
}
