import type { Plot } from "./plot.ts";

/** More labels than these run over each other and over the curves in a plot of a phone's width. */
const MOST_IN_PLOT = 3;

/** Whether the limits of a narrow plot are named in the list below it instead of beside their lines. */
export const limitsInList = ({ xLimits = [], yLimits = [] }: Plot): boolean =>
  xLimits.length + yLimits.length > MOST_IN_PLOT;
