import type { Working, WorkingLine } from "../working.ts";
import { ROOM_TEMPERATURE, type Layer } from "./layer.ts";
import { solveLaminate, type LaminateOptions } from "./solve-laminate.ts";

/** The curvature of `solveLaminate` as data: for each layer, bottom to top, what went into the sums. */
export function laminateWorking(layersBottomToTop: readonly Layer[], o: LaminateOptions = {}): Working {
  if (o.slidingOn) return slidingWorking(layersBottomToTop, o.slidingOn, o);
  const solved = solveLaminate(layersBottomToTop, o);
  const temperature: WorkingLine = {
    symbol: "T",
    meaning: "temperature",
    value: o.temperature ?? ROOM_TEMPERATURE,
    unit: "K",
    temperaturePoint: true,
  };
  return {
    equation: "laminate",
    inputs: [
      temperature,
      ...layersBottomToTop.flatMap((layer, n) => layerLines(layer, n + 1, solved.freeStrain[n] ?? 0)),
    ],
    result: { symbol: "κ", meaning: "curvature, bowl positive", value: solved.curvature, unit: "1/m" },
    note: "Layers are counted from the bottom, device side on top.",
  };
}

function slidingWorking(wafer: readonly Layer[], slidingOn: readonly Layer[], o: LaminateOptions): Working {
  const { temperature, alsoSlidingOn } = o;
  const at = temperature === undefined ? {} : { temperature };
  const plates = [wafer, slidingOn, ...(alsoSlidingOn ? [alsoSlidingOn] : [])].map((layers) => ({
    layers,
    solved: solveLaminate(layers, at),
  }));
  return {
    equation: "sliding-pair",
    inputs: plates.flatMap(({ solved }, n): WorkingLine[] => [
      { symbol: `κ_${n + 1}`, meaning: `curvature of plate ${n + 1} by itself`, value: solved.curvature, unit: "1/m" },
      {
        symbol: `D_${n + 1}`,
        meaning: `bending stiffness of plate ${n + 1}`,
        value: solved.bendingStiffness,
        unit: "N·m",
      },
    ]),
    result: {
      symbol: "κ",
      meaning: `curvature of ${alsoSlidingOn ? "all" : "both"}, bowl positive`,
      value: solveLaminate(wafer, o).curvature,
      unit: "1/m",
    },
    note: alsoSlidingOn
      ? "Both adhesives are above their flow points and carry no shear. Plate 1 is the wafer, plates 2 and 3 the carriers."
      : "The adhesive is above its flow point and carries no shear. Plate 1 is the wafer with all that does not slide, plate 2 the carrier.",
    from: plates.map(({ layers }) => laminateWorking(layers, at)),
  };
}

function layerLines(layer: Layer, position: number, freeStrain: number): WorkingLine[] {
  const lines: WorkingLine[] = [
    { symbol: `h_${position}`, meaning: `thickness of layer ${position}`, value: layer.thickness, unit: "m" },
    {
      symbol: `M_${position}`,
      meaning: `biaxial modulus of layer ${position}`,
      value: layer.youngsModulus / (1 - layer.poissonsRatio),
      unit: "Pa",
    },
    { symbol: `e_${position}`, meaning: `free strain of layer ${position}`, value: freeStrain, unit: "1" },
  ];
  if (layer.coverage !== undefined) {
    lines.push({
      symbol: `f_${position}`,
      meaning: `area fraction of layer ${position}`,
      value: layer.coverage,
      unit: "1",
    });
  }
  return lines;
}
