import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { siliconText } from "./flow-thickness.ts";

interface Flow {
  silicon: { name: string; diameter: number };
  incoming: Measured;
  thinnest: Measured | null;
  hottest: number | null;
  rows: readonly unknown[];
}

const silicon = (measured: Measured) => `${siliconText(measured)}\u00A0µm`;

/** The figures that say what kind of flow this is, each with its unit. */
export function flowFigures({ silicon: wafer, incoming, thinnest, hottest, rows }: Flow) {
  return [
    { label: "Silicon", value: wafer.name },
    { label: "Comes in at", value: silicon(incoming) },
    { label: "Thinnest", value: thinnest ? silicon(thinnest) : "no steps yet" },
    {
      label: "Hottest step",
      value: hottest === null ? "no steps yet" : formatQuantity(hottest, "temperature", { unit: "°C" }),
    },
    { label: "Steps", value: String(rows.length) },
  ];
}
