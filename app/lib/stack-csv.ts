import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { ChartOthers } from "./stack-chart.ts";
import type { Estimated } from "./stack-words.ts";

const HEAD = ["stack", "temperature_K", "silicon_thickness_um", "warp_um", "linear_warp_um", "regime"];

/**
 * The curves of a chart as CSV with a point as decimal mark: one row per curve and thickness, full precision, in µm. Text that a
 * spreadsheet would run as a formula is defused.
 */
export function stackCsv(name: string, room: Estimated, { hot, overlay }: ChartOthers): string {
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
  return [HEAD, ...rows].map((cells) => `${cells.map(csvCell).join(",")}\r\n`).join("");
}

const micrometres = (metres: number) => Number((metres * 1e6).toPrecision(12));

/** One cell: numbers as they are, text quoted where it must be and never the start of a formula. */
export function csvCell(value: string | number): string {
  if (typeof value === "number") return String(value);
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
