/**
 * The engine's answers to the cases of the outside check, as JSON on standard output, in the order of cases.json.
 */
import { readFileSync } from "node:fs";
import {
  criticalLinearCurvature,
  freeWaferShape,
  gravitySag,
  siliconThermalStrain,
  solveDirectionalLaminate,
  solveLaminate,
  type DirectionalLayer,
  type Layer,
} from "#app/engine/index.ts";
import { solveScan, solveSurface, type ScanCase, type SurfaceCase } from "./scan-cases.ts";

/** Layers as cases.json has them: a repeated group stands for its layers, over and over. */
type Written = DirectionalLayer | { times: number; of: DirectionalLayer[] };

interface Stack {
  temperature: number;
  layers: Written[];
  /** a second stack on top that slides on the first; both plain */
  slidingOn?: Written[];
}

interface Cases {
  laminates: Stack[];
  expansion: { from: number; to: number }[];
  layeredDiscs: Stack[];
  freeWafers: Parameters<typeof freeWaferShape>[0][];
  onsets: Parameters<typeof criticalLinearCurvature>[0][];
  pins: (Parameters<typeof gravitySag>[0] & { count: number; supportRadius: number })[];
  scans: ScanCase[];
  surfaces: SurfaceCase[];
}

function expand(layers: Written[]): DirectionalLayer[] {
  return layers.flatMap((l) => ("times" in l ? Array.from({ length: l.times }, () => l.of).flat() : [l]));
}

/** The plain laminate takes what is equal in both directions. */
function isPlain(layer: DirectionalLayer): layer is Layer {
  return layer.silicon === undefined && layer.pattern === undefined && typeof layer.stress !== "object";
}

/** Curvatures (x, y, twist), strain of the middle plane and stress per layer, lower and upper face, in all three parts. */
function solveStack({ layers, temperature, slidingOn }: Stack) {
  const stack = expand(layers);
  const top = expand(slidingOn ?? []);
  if (stack.every(isPlain) && top.every(isPlain)) {
    const options = slidingOn ? { temperature, slidingOn: top } : { temperature };
    const { curvature, midplaneStrain, stressBottom, stressTop } = solveLaminate(stack, options);
    const both = (value: number) => [value, value, 0];
    return {
      curvature: both(curvature),
      midplaneStrain: both(midplaneStrain),
      stress: stressBottom.map((bottom, n) => [both(bottom), both(stressTop[n] ?? NaN)]),
    };
  }
  const r = solveDirectionalLaminate(stack, { temperature });
  const parts = ({ x, y, xy }: { x: number; y: number; xy: number }) => [x, y, xy];
  return {
    curvature: [r.curvatureX, r.curvatureY, r.twist],
    midplaneStrain: parts(r.midplaneStrain),
    stress: r.stressBottom.map((bottom, n) => [parts(bottom), parts(r.stressTop[n] ?? { x: NaN, y: NaN, xy: NaN })]),
  };
}

const cases = JSON.parse(readFileSync(new URL("cases.json", import.meta.url), "utf8")) as Cases;
const answers = {
  laminates: cases.laminates.map(solveStack),
  expansion: cases.expansion.map(({ from, to }) => siliconThermalStrain(from, to)),
  layeredDiscs: cases.layeredDiscs.map(solveStack),
  freeWafers: cases.freeWafers.map((wafer) => freeWaferShape(wafer)),
  onsets: cases.onsets.map((wafer) => criticalLinearCurvature(wafer)),
  scans: cases.scans.map(solveScan),
  surfaces: cases.surfaces.map(solveSurface),
  pins: cases.pins.map(({ count, supportRadius, ...wafer }) =>
    gravitySag({ ...wafer, support: { kind: "points", count, radius: supportRadius } }),
  ),
};
process.stdout.write(JSON.stringify(answers));
