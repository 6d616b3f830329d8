import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { siliconText } from "./flow-thickness.ts";

interface Flow {
  silicon: { name: string; diameter: number };
  incoming: Measured;
  /** measured standard bow along and across the notch; null when nobody gave it */
  incomingBow: { along: Measured; across: Measured } | null;
  thinnest: Measured | null;
  hottest: number | null;
  rows: readonly unknown[];
  /** the slots of each leg, in words; empty where every wafer takes every step */
  legs: readonly string[];
}

const silicon = (measured: Measured) => `${siliconText(measured)}\u00A0µm`;

const um = (value: number) => formatQuantity(value, "length", { unit: "µm" });

function comesIn(incoming: Measured, bow: Flow["incomingBow"]): string {
  if (!bow) return silicon(incoming);
  const { along, across } = bow;
  const bows = along.value === across.value ? um(along.value) : `${um(along.value)} and ${um(across.value)}`;
  return `${silicon(incoming)}, bow ${bows}`;
}

/** The figures that say what kind of flow this is, each with its unit. */
export function flowFigures({ silicon: wafer, incoming, incomingBow, thinnest, hottest, rows, legs }: Flow) {
  return [
    { label: "Silicon", value: wafer.name },
    { label: "Comes in at", value: comesIn(incoming, incomingBow) },
    { label: "Thinnest", value: thinnest ? silicon(thinnest) : "no steps yet" },
    {
      label: "Hottest step",
      value: hottest === null ? "no steps yet" : formatQuantity(hottest, "temperature", { unit: "°C" }),
    },
    { label: "Steps", value: String(rows.length) },
    ...(legs.length > 0 ? [{ label: "Parts by slot into", value: legs.join("; ") }] : []),
  ];
}
