import type { PointerEvent } from "react";
import { useDrag } from "#app/components/ui/use-drag.ts";

interface Drag {
  id: string;
  /** the step goes before the row of this index; the number of rows is the end */
  before: number;
}

/** Height of the bands at the edges of the window in which dragging scrolls, px. */
const EDGE = 72;
const SCROLL = 14;

const stepRows = () => [...document.querySelectorAll<HTMLElement>("tr[id^='step-']")];

/** Index of the row before which a pointer at this height would drop. */
function placeAt(y: number): number {
  const rows = stepRows();
  const below = rows.findIndex((row) => {
    const { top, height } = row.getBoundingClientRect();
    return y < top + height / 2;
  });
  return below < 0 ? rows.length : below;
}

/**
 * Moves rows of the step table by a handle, with mouse, pen or finger. `onDrop` is told the step and its new number, from 1, and only
 * when that is another. Escape lets go. Everything that it does can be done by the buttons of the row too.
 */
export function useStepDrag(onDrop: (id: string, number: number) => void) {
  const { drag, current, show } = useDrag<Drag>();
  const handle = (id: string) => ({
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      if (event.button !== 0) return;
      event.preventDefault();
      event.currentTarget.setPointerCapture(event.pointerId);
      show({ id, before: placeAt(event.clientY) });
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      if (!current.current) return;
      if (event.clientY < EDGE && event.movementY < 0) window.scrollBy(0, -SCROLL);
      else if (event.clientY > window.innerHeight - EDGE && event.movementY > 0) window.scrollBy(0, SCROLL);
      show({ id, before: placeAt(event.clientY) });
    },
    onPointerUp: () => {
      const dropped = current.current;
      show(null);
      if (!dropped) return;
      const from = stepRows().findIndex((row) => row.id === `step-${dropped.id}`);
      const to = dropped.before > from ? dropped.before - 1 : dropped.before;
      if (from >= 0 && to !== from) onDrop(dropped.id, to + 1);
    },
    onPointerCancel: () => show(null),
  });
  return { drag, handle };
}
