import { formatMeasured } from "#app/lib/format-measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";

type Film = LibraryRecords["film"];

/** What a film does to a wafer by itself, on the device side, device side up. */
export function filmAnswer({ stress }: Film): string {
  if (stress.value === 0) return "Without stress at 25\u00A0°C: by itself it does not bend the wafer.";
  const pull = formatMeasured(stress, "stress", { unit: "MPa", sign: true });
  return stress.value > 0
    ? `In tension at 25\u00A0°C, ${pull}: on the device side it pulls the wafer to a bowl, edges up.`
    : `In compression at 25\u00A0°C, ${pull}: on the device side it pushes the wafer to a dome, edges down.`;
}

/** What becomes of that with heat. */
export function filmHistory({ kind, yieldStress }: Film): string {
  if (kind === "polymer")
    return "Heat takes its stress down to zero and never into compression; cooling brings it back.";
  return kind === "metal" && yieldStress
    ? `It yields at ${formatMeasured(yieldStress, "stress", { unit: "MPa" })}, so a hot step can leave it with another stress.`
    : "It is taken as elastic: heat changes its stress only while it lasts.";
}

/** What a film's stress was measured on: '5.0 µm, as deposited, on 725 µm silicon of 200 mm'. */
export function measuredOn(handling: Film["handling"]): string {
  const { stressState, stressFilmThickness, monitorThickness, monitorDiameter } = handling;
  const length = (value: number, unit: string) => formatQuantity(value, "length", { unit });
  const on = [
    monitorThickness === null ? null : `${length(monitorThickness, "µm")} silicon`,
    monitorDiameter === null ? null : `a wafer of ${length(monitorDiameter, "mm")}`,
  ].filter((part) => part !== null);
  const parts = [
    stressFilmThickness === null ? null : length(stressFilmThickness, "µm"),
    stressState,
    on.length > 0 ? `on ${on.join(", ")}` : null,
  ].filter((part) => part !== null);
  return parts.join(", ") || "not given";
}
