import { useCallback, useEffect, useRef, useState } from "react";

/**
 * What is being dragged, and where to. A pointer may be let go before what its last move said is drawn, so `current` has it at once;
 * `drag` is what is drawn. Escape lets go, which `onLetGo` is told: the same function for as long as the caller is drawn.
 */
export function useDrag<Drag>(onLetGo?: () => void) {
  const [drag, setDrag] = useState<Drag | null>(null);
  const current = useRef<Drag | null>(null);
  const show = useCallback((next: Drag | null) => {
    current.current = next;
    setDrag(next);
  }, []);
  const dragging = drag !== null;
  useEffect(() => {
    if (!dragging) return undefined;
    const press = (event: KeyboardEvent) => {
      if (event.key !== "Escape") return;
      onLetGo?.();
      show(null);
    };
    window.addEventListener("keydown", press);
    return () => window.removeEventListener("keydown", press);
  }, [dragging, onLetGo, show]);
  return { drag, current, show };
}
