import type { MouseEvent } from "react";

/**
 * Click handler of a link that selects in place where scripts run. Without a handler, and with a modifier key held, the
 * link stays an ordinary one.
 */
export function selectInPlace(select: (() => void) | undefined): ((event: MouseEvent) => void) | undefined {
  if (select === undefined) return undefined;
  return (event) => {
    if (event.metaKey || event.ctrlKey || event.shiftKey || event.altKey || event.button !== 0) return;
    event.preventDefault();
    select();
  };
}
