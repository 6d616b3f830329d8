import { useEffect, useRef } from "react";
import { undoKey, type Direction } from "#app/lib/undo-key.ts";

/** Names of the fields that belong to the stack; what else stands in the form is only a way to look at it. */
const OF_STACK = /^(?:name|note|silicon|siliconThickness|layers)\b/;

/**
 * Control or command with Z takes back, with shift or with Y does again. In a field whose text has not been noted yet, and in one that is
 * not of the stack, they are the browser's own.
 */
export function useUndoKeys(onStep: (direction: Direction) => void, unnoted: boolean): void {
  const latest = useRef({ onStep, unnoted });
  useEffect(() => {
    latest.current = { onStep, unnoted };
  });
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      const direction = undoKey(event);
      if (direction === null || isBrowsers(event.target, latest.current.unnoted)) return;
      event.preventDefault();
      latest.current.onStep(direction);
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, []);
}

function isBrowsers(target: EventTarget | null, unnoted: boolean): boolean {
  if (!(target instanceof Element)) return false;
  if (target.closest("dialog") !== null) return true;
  return isText(target) && (unnoted || !OF_STACK.test(target.name));
}

/** Whether text is typed into it. */
export const isText = (target: unknown): target is HTMLInputElement | HTMLTextAreaElement =>
  target instanceof HTMLTextAreaElement || (target instanceof HTMLInputElement && target.type === "text");
