import type { KeyboardEvent } from "react";

/** Alt with an arrow up or down moves a film; on a choice the keys are the browser's own, which opens its list. */
export function shiftByKey(event: KeyboardEvent, shift: (by: 1 | -1) => void): void {
  if (!event.altKey || event.ctrlKey || event.metaKey || event.target instanceof HTMLSelectElement) return;
  const by = event.key === "ArrowUp" ? -1 : event.key === "ArrowDown" ? 1 : null;
  if (by === null) return;
  event.preventDefault();
  shift(by);
}
