import type { PlaneBox } from "#app/components/drawings/plane.ts";
import { textWidth } from "#app/components/drawings/text-width.ts";

/** The stack's own place, px, with its answer. */
export interface Mark {
  x: number;
  y: number;
  text: string;
}

/** The words of the stack's own place: right of its mark, left of it where there is no room; clear of the frame. */
export function ownWords({ x, y, text }: Mark, box: PlaneBox, textSize: number): { x: number; y: number } {
  const half = textWidth(text, textSize, true) / 2 + 14;
  const inside = Math.min(box.bottom - textSize, Math.max(box.top + textSize, y));
  return { x: x + 2 * half <= box.right ? x + half : x - half, y: inside };
}
