import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { csvOf, type CsvMark } from "./csv.ts";
import type { ChartOthers } from "./stack-chart.ts";
import type { Estimated } from "./stack-words.ts";

const HEAD = ["stack", "temperature_K", "silicon_thickness_um", "warp_um", "linear_warp_um", "regime"];

/**
 * The curves of a chart as CSV: one row per curve and thickness, full precision, in µm.
 */
export function stackCsv(name: string, room: Estimated, { hot, overlay }: ChartOthers, mark?: CsvMark): string {
  const curves = [
    { name, estimated: room },
    ...(hot ? [{ name, estimated: hot }] : []),
    ...(overlay ? [{ name: overlay.name, estimated: overlay }] : []),
  ];
  const rows = curves.flatMap(({ name: stack, estimated: { request, answer } }) =>
    (answer.sweep ?? []).map(({ thickness_m, warp_m, linear_warp_m, regime }) => [
      stack,
      request.temperature_K ?? ROOM_TEMPERATURE,
      micrometres(thickness_m),
      micrometres(warp_m),
      micrometres(linear_warp_m),
      regime,
    ]),
  );
  return csvOf([HEAD, ...rows], mark);
}

const micrometres = (metres: number) => Number((metres * 1e6).toPrecision(12));
