import { formatQuantity } from "#app/engine/units/format.ts";
import type { Plot, PlotPoint } from "./plot.ts";
import { multiples, niceStep, signedTick } from "./plot-ticks.ts";

/** Expansion over temperature, straight between its points; `points` in K and 1/K. */
export function expansionPlot(points: readonly PlotPoint[]): Plot {
  const [from, to] = [points[0]?.x ?? 0, points.at(-1)?.x ?? 1];
  const values = points.map(({ y }) => y);
  const [low, high] = [Math.min(0, ...values), Math.max(0, ...values)];
  const room = (high - low || PPM) * 0.08;
  const top = high + room;
  const bottom = low < 0 ? low - room : 0;
  const celsius = (kelvin: number) => kelvin - ZERO_CELSIUS;
  return {
    x: {
      scale: "linear",
      from,
      to,
      ticks: multiples(niceStep((to - from) / 5), celsius(from), celsius(to)).map((value) => ({
        value: value + ZERO_CELSIUS,
        text: signedTick(value),
      })),
      title: "Temperature, °C",
      format: (kelvin) => formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 }),
    },
    y: {
      scale: "linear",
      from: bottom,
      to: top,
      ticks: multiples(niceStep((top - bottom) / 4), bottom, top).map((value) => ({
        value,
        text: `${signedTick(Number((value / PPM).toPrecision(6)))}\u00A0ppm/K`,
      })),
      format: (value) => formatQuantity(value, "expansion", { unit: "ppm/K", significant: 3 }),
    },
    series: [
      {
        id: "expansion",
        label: "expansion",
        dash: "solid",
        marker: "circle",
        colourToken: "silicon",
        points,
        markersAt: points.map(({ x }) => x),
        labelled: "none",
      },
    ],
  };
}

const PPM = 1e-6;
const ZERO_CELSIUS = 273.15;
