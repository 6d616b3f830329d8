import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import type { CutProps } from "#app/components/drawings/Cut.tsx";
import type { CutLayer } from "#app/components/drawings/cut-layer.ts";
import { knownShapeWord } from "#app/engine/vocabulary.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import type { TriedPair } from "#app/lib/pair-trial.ts";

const micrometres = (value: number) => formatQuantity(value, "length", { unit: "µm" });
const celsius = (value: number) => formatQuantity(value, "temperature", { unit: "°C" });

/** The tried pair as it lies on a tool: silicon on top with its back side up, carrier below, and the shape that results. */
export function pairCut(carrier: LibraryRecords["carrier"], pair: TriedPair): CutProps {
  const { wafer, material, siliconLeft, bondThickness } = pair;
  const layers: CutLayer[] = [
    {
      role: "silicon",
      kind: "silicon",
      thickness: siliconLeft,
      thicknessText: micrometres(siliconLeft),
      name: wafer.name,
      notes: [
        "blank: no films",
        ...(siliconLeft < wafer.thickness ? [`ground from ${micrometres(wafer.thickness)}`] : []),
      ],
    },
    {
      role: "adhesive",
      kind: "adhesive",
      thickness: bondThickness,
      thicknessText: micrometres(bondThickness),
      name: material.name,
      notes: [
        `bonded at ${celsius(material.bondTemperature)}`,
        ...(pair.locksAt < material.bondTemperature ? [`locks at ${celsius(pair.locksAt)}`] : []),
        `locked in ${formatMeasured(material.effectiveModulus, "stress", { unit: "MPa" })}`,
      ],
      assumed: material.effectiveModulus.source === "assumed",
    },
    {
      role: "carrier",
      kind: carrier.material,
      thickness: carrier.thickness.value,
      thicknessText: micrometres(carrier.thickness.value),
      name: carrier.name,
      notes: [
        carrier.expansion
          ? formatMeasured(carrier.expansion, "expansion", { unit: "ppm/K" })
          : carrier.expansionCurve
            ? "expands by its curve"
            : "expands as the wafer does",
      ],
      assumed: (carrier.expansion ?? carrier.expansionCurve)?.source === "assumed",
    },
  ];
  const exaggeration = chooseExaggeration([pair.bow], wafer.diameter);
  // Back side up, so the standard bow, which is seen device side up, is turned over.
  const shape: NonNullable<CutProps["shape"]>["shape"] =
    pair.regime === "curled" && pair.rollRadius !== null
      ? { kind: "rolled", radius: pair.rollRadius, edgesUp: pair.bow > 0 }
      : { kind: "bowed", bow: -pair.bow };
  return {
    layers,
    top: { words: "Back side, up on the tool" },
    bottom: { words: "Carrier, down" },
    label: `${carrier.name} bonded to ${wafer.name} with ${material.name}`,
    shape: {
      diameter: wafer.diameter,
      shape,
      deviceSideUp: false,
      holding: "carrier",
      exaggeration,
      head: "As it lies at 25\u00A0°C",
      note:
        shape.kind === "rolled"
          ? "rolls up, ×1"
          : `${knownShapeWord(pair.lies, pair.warp, pair.uncertainty)}, ×${exaggeration}`,
    },
  };
}
