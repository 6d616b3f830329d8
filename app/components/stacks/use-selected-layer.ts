import { useEffect, useRef, useState } from "react";
import type { CutPartOf } from "./stack-cut-layers.ts";

/**
 * Which layer is edited, by its key, so that it stays selected when it moves. A film that has just been added becomes the
 * selected one and takes the focus; when the selected one is removed its neighbour follows.
 * @param keys keys of the list's films in their order
 * @param focus moves the focus to a layer's first field; the same function from render to render
 */
export function useSelectedLayer(keys: readonly string[], focus: (part: CutPartOf) => void) {
  const [known, setKnown] = useState(keys);
  const [selected, setSelected] = useState<string | null>(keys[0] ?? null);
  const [arrived, setArrived] = useState<string | null>(null);
  const [expected, setExpected] = useState<number | null>(null);
  if (keys.length !== known.length || keys.some((key, index) => key !== known[index])) {
    setKnown(keys);
    setExpected(null);
    const added = keys.find((key) => !known.includes(key));
    if (expected !== null) setSelected(keys[expected] ?? keys.at(-1) ?? null);
    else if (added !== undefined && keys.length > known.length) {
      setSelected(added);
      setArrived(added);
    } else if (selected !== null && !keys.includes(selected)) {
      const next = keys[Math.min(known.indexOf(selected), keys.length - 1)] ?? null;
      setSelected(next);
      setArrived(next);
    }
  }
  const index = selected === null ? -1 : keys.indexOf(selected);
  const part: CutPartOf = index === -1 ? "silicon" : index;
  const focused = useRef<string | null>(null);
  useEffect(() => {
    if (arrived === null || arrived === focused.current) return;
    focused.current = arrived;
    focus(part);
  }, [arrived, part, focus]);
  const select = (next: CutPartOf) => {
    setExpected(null);
    setSelected(next === "silicon" ? null : (keys[next] ?? null));
  };
  /** Says which film is the selected one once the list, which is about to change, has changed; the focus stays with who asked. */
  const expect = (next: number) => setExpected(next);
  return { part, select, expect };
}
