import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { Working, WorkingLine } from "../working.ts";
import type { DirectionalLayer } from "./layer.ts";
import { solveDirectionalLaminate } from "./solve-directional-laminate.ts";

/** Which of the three figures of the surface a working is for. */
export type SurfacePart = "curvatureX" | "curvatureY" | "twist";

const RESULTS: Record<SurfacePart, { symbol: string; meaning: string }> = {
  curvatureX: { symbol: "κ_x", meaning: "curvature along x, bowl positive" },
  curvatureY: { symbol: "κ_y", meaning: "curvature along y, bowl positive" },
  twist: { symbol: "t", meaning: "twist" },
};

/** One curvature of `solveDirectionalLaminate` as data: for each layer, bottom to top, what went into the sums. */
export function directionalLaminateWorking(
  layersBottomToTop: readonly DirectionalLayer[],
  part: SurfacePart,
  o: { temperature?: number } = {},
): Working {
  const solved = solveDirectionalLaminate(layersBottomToTop, o);
  return {
    equation: "directional-laminate",
    inputs: [
      {
        symbol: "T",
        meaning: "temperature",
        value: o.temperature ?? ROOM_TEMPERATURE,
        unit: "K",
        temperaturePoint: true,
      },
      ...layersBottomToTop.flatMap((layer, n) => layerLines(layer, n + 1, solved.freeStrain[n])),
    ],
    result: { ...RESULTS[part], value: solved[part], unit: "1/m" },
    note: "Layers are counted from the bottom, device side on top.",
  };
}

function layerLines(
  layer: DirectionalLayer,
  position: number,
  freeStrain: { x: number; y: number; xy: number } = { x: 0, y: 0, xy: 0 },
): WorkingLine[] {
  const of = `layer ${position}`;
  return [
    { symbol: `h_${position}`, meaning: `thickness of ${of}`, value: layer.thickness, unit: "m" },
    ...materialLines(layer, position, of),
    { symbol: `e_x${position}`, meaning: `free strain of ${of} along x`, value: freeStrain.x, unit: "1" },
    { symbol: `e_y${position}`, meaning: `free strain of ${of} along y`, value: freeStrain.y, unit: "1" },
  ];
}

function materialLines(layer: DirectionalLayer, position: number, of: string): WorkingLine[] {
  if (layer.silicon !== undefined) {
    const { direction, angle = 0 } = layer.silicon;
    const meaning = `angle of <${direction}> of silicon from x, ${of}`;
    return [{ symbol: `φ_${position}`, meaning, value: angle, unit: "rad" }];
  }
  const lines: WorkingLine[] = [
    { symbol: `E_${position}`, meaning: `Young's modulus of ${of}`, value: layer.youngsModulus, unit: "Pa" },
    { symbol: `ν_${position}`, meaning: `Poisson's ratio of ${of}`, value: layer.poissonsRatio, unit: "1" },
  ];
  const { pattern } = layer;
  const coverage = pattern === undefined ? layer.coverage : pattern.kind === "full" ? undefined : pattern.coverage;
  if (coverage !== undefined) {
    lines.push({ symbol: `f_${position}`, meaning: `area fraction of ${of}`, value: coverage, unit: "1" });
  }
  if (pattern?.kind === "lines") {
    lines.push(
      { symbol: `w_${position}`, meaning: `width of the lines of ${of}`, value: pattern.lineWidth, unit: "m" },
      { symbol: `φ_${position}`, meaning: `angle of the lines of ${of} from x`, value: pattern.direction, unit: "rad" },
    );
  }
  if (pattern?.kind === "islands") {
    lines.push({ symbol: `w_${position}`, meaning: `size of the islands of ${of}`, value: pattern.size, unit: "m" });
  }
  return lines;
}
