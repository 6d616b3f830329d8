import type { WarpPlotInput } from "#app/components/drawings/warp-plot.ts";
import type { PlotLimit, PlotPoint } from "#app/components/drawings/plot.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { thicknessLimits } from "#app/engine/rules/required-support.ts";
import { lengthWords, limitWords, temperatureWords, thicknessWords, type Estimated } from "./stack-words.ts";

/** What the chart shows besides the stack at 25 °C. */
export interface ChartOthers {
  hot: Estimated | null;
  overlay: (Estimated & { name: string }) | null;
}

/** A warp below this is as good as none and has no place on a logarithmic axis, m. */
export const LEAST_DRAWN = 1e-7;
/** Lift of the rim over the radius when the roll is half a turn across: beyond it the figure means nothing. */
export const HALF_TURN = 2 / Math.PI;
/** Longest name at the end of a line; the table below the chart has the whole one. */
const LONGEST_NAME = 20;

/** One point of a curve: warp of the free wafer, and Stoney's size of bow for comparison, m. */
interface CurvePoint {
  thickness: number;
  warp: number;
  linear: number;
}

/** The curve of an estimate, with the thickness that was estimated as a point of its own. */
function curvePoints({ request, answer }: Estimated): CurvePoint[] {
  const own = {
    thickness: request.wafer.thickness_m,
    warp: answer.shape.warp_m,
    linear: Math.abs(answer.stoney.bow_m),
  };
  const swept = (answer.sweep ?? []).map((point) => ({
    thickness: point.thickness_m,
    warp: point.warp_m,
    linear: point.linear_warp_m,
  }));
  const others = swept.filter(({ thickness }) => thickness !== own.thickness);
  return [...others, own].sort((a, b) => a.thickness - b.thickness);
}

/** A curve for the chart: from the thick end down to where the roll passes half a turn, without what is as good as flat. */
export function drawnCurve(estimated: Estimated, of: "warp" | "linear"): PlotPoint[] {
  const stop = (HALF_TURN * estimated.request.wafer.diameter_m) / 2;
  const points = curvePoints(estimated);
  const rolled = points.findLastIndex((point) => point[of] >= stop);
  return points
    .slice(rolled + 1)
    .map((point) => ({ x: point.thickness, y: point[of] }))
    .filter(({ y }) => y >= LEAST_DRAWN);
}

type Series = WarpPlotInput["series"][number];

/** The chart of warp against silicon thickness, or null when the wafer stays as good as flat throughout. */
export function warpChart(room: Estimated, { hot, overlay }: ChartOthers, limits: SiteLimits): WarpPlotInput | null {
  const { diameter_m, thickness_m } = room.request.wafer;
  const series: Series[] = [
    {
      id: "drawn",
      label: "as drawn, 25\u00A0°C",
      dash: "solid",
      marker: "circle",
      colourToken: "silicon",
      points: drawnCurve(room, "warp"),
    },
  ];
  if (hot)
    series.push({
      id: "hot",
      label: `at ${temperatureWords(hot.request.temperature_K ?? ROOM_TEMPERATURE)}`,
      dash: "chain",
      marker: "square",
      colourToken: "copper",
      points: drawnCurve(hot, "warp"),
    });
  if (overlay)
    series.push({
      id: "overlay",
      label: shortened(overlay.name),
      dash: "dotted",
      marker: "triangle",
      colourToken: "clear",
      points: drawnCurve(overlay, "warp"),
    });
  series.push({
    id: "linear",
    label: "linear",
    dash: "reference",
    marker: "none",
    colourToken: "silicon",
    labelled: "along",
    points: drawnCurve(room, "linear"),
  });
  if (!series.some(({ points }) => points.some(({ y }) => y >= limits.flatWithin.value))) return null;
  const curls = room.answer.curls_below_m;
  return {
    series: series.filter(({ points }) => points.length > 1),
    thicknessLimits: limitLines(diameter_m, limits),
    curling: curls === null ? undefined : { thickness: curls, label: `curls below ${limitWords(curls)}` },
    chosenThickness: thickness_m,
    formatThickness: thicknessWords,
    formatWarp: lengthWords,
  };
}

export const shortened = (name: string) =>
  name.length <= LONGEST_NAME ? name : `${name.slice(0, LONGEST_NAME - 1).trimEnd()}…`;

/** The site's thickness limits for a diameter, as lines across the chart. */
export function limitLines(diameter: number, limits: SiteLimits): PlotLimit[] {
  const keys = thicknessLimits(diameter);
  if (!keys) return [];
  const line = (value: number, words: string) => ({ value, lines: [words, `below ${limitWords(value)}`] });
  return [
    line(limits.carrierBelow.value, "carrier"),
    line(limits[keys.gripper].value, "tape or ring"),
    line(limits[keys.bare].value, "gripper"),
  ];
}
