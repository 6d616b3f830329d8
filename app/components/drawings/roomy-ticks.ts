import type { PlotTick } from "./plot.ts";
import { textWidth } from "./text-width.ts";

/** The ticks of a level axis whose text has room: from the left, each that clears the one before by 5 px. */
export function roomyTicks(ticks: readonly PlotTick[], scale: (value: number) => number, textSize: number): PlotTick[] {
  let free = -Infinity;
  return ticks.filter((tick) => {
    const half = textWidth(tick.text, textSize) / 2;
    const middle = scale(tick.value);
    if (middle - half < free) return false;
    free = middle + half + 5;
    return true;
  });
}
