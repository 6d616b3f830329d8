import { useState } from "react";

/** The ids that are ticked; they outlast a turn of the list's page. */
export function useTicked() {
  const [ticked, setTicked] = useState<ReadonlySet<string>>(new Set());
  const tick = (id: string, on: boolean) =>
    setTicked((before) => {
      const next = new Set(before);
      if (on) next.add(id);
      else next.delete(id);
      return next;
    });
  return { ticked, tick, clear: () => setTicked(new Set()) };
}
