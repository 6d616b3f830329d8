import { useCallback, useRef, type MouseEvent, type PointerEvent } from "react";
import { useDrag } from "#app/components/ui/use-drag.ts";
import type { CutPlace } from "./cut-layout.ts";

interface CutDrag {
  /** the layer that is moved */
  from: number;
  /** the layer that it would go before; the number of layers is the foot of the cut */
  before: number;
}

/** A hand that shakes is no drag, px. */
const SLACK = 6;

/**
 * Moves layers of a cut with mouse or pen; a finger scrolls. `onMove` is told where a layer was let go, and only where that is another
 * place. Escape lets go. Everything that it does can be done by keys and buttons too.
 */
export function useCutDrag(places: readonly CutPlace[], onMove: ((drag: CutDrag) => void) | undefined) {
  const begun = useRef<{ from: number; y: number } | null>(null);
  const dragged = useRef(false);
  const letGo = useCallback(() => {
    begun.current = null;
  }, []);
  const { drag, current, show } = useDrag<CutDrag>(letGo);
  const handle = (from: number) => ({
    onPointerDown: (event: PointerEvent<SVGElement>) => {
      dragged.current = false;
      if (event.button === 0 && event.pointerType !== "touch") begun.current = { from, y: event.clientY };
    },
    onPointerMove: (event: PointerEvent<SVGElement>) => {
      // Let go elsewhere, before it was a drag.
      if (event.buttons === 0) begun.current = null;
      if (!begun.current) return;
      if (!current.current) {
        if (Math.abs(event.clientY - begun.current.y) < SLACK) return;
        event.currentTarget.setPointerCapture(event.pointerId);
      }
      dragged.current = true;
      // A quick pointer has left its layer by its first move.
      show({ from: begun.current.from, before: placeOf(event, places) });
    },
    onPointerUp: () => {
      const dropped = current.current;
      begun.current = null;
      show(null);
      if (dropped && dropped.before !== dropped.from && dropped.before !== dropped.from + 1) onMove?.(dropped);
    },
    onPointerCancel: () => {
      begun.current = null;
      show(null);
    },
    // A layer is a link, which a browser would carry off; and letting go of one is no click on it.
    onDragStart: (event: { preventDefault: () => void }) => event.preventDefault(),
    onClickCapture: (event: MouseEvent) => {
      if (!dragged.current) return;
      dragged.current = false;
      event.preventDefault();
      event.stopPropagation();
    },
  });
  return { drag, handle: onMove ? handle : undefined };
}

/** The layer whose middle lies below the pointer first; the number of layers when none does. */
function placeOf({ currentTarget, clientY }: PointerEvent<SVGElement>, places: readonly CutPlace[]): number {
  const svg = currentTarget.ownerSVGElement;
  if (!svg) return 0;
  const { top, height } = svg.getBoundingClientRect();
  const y = ((clientY - top) * svg.viewBox.baseVal.height) / height;
  const below = places.findIndex((place) => y < place.y + place.height / 2);
  return below === -1 ? places.length : below;
}
