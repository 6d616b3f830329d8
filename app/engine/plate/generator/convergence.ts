import { isotropicRatios, membraneStiffness, type ShearRatios } from "../shear-ratios.ts";
import { at } from "../table/elements.ts";
import { loadVector, settle } from "./equilibrium.ts";
import { measurer } from "./measures.ts";
import { ritzPlate, ritzSpace } from "./ritz-plate.ts";

const DEGREES = [8, 12, 16, 20, 24, 28] as const;
const POISSONS_RATIO = 0.28;

/**
 * Rows of degree, critical load, then bow along the roll (over 2 h) and centre curvature across it (times R²/(4h)) under loads
 * of 7.2 and 28.7, 5 and 20 times the critical one.
 */
export function convergence(): number[][] {
  return DEGREES.map((degree) => {
    const space = ritzSpace("even", degree);
    const ratios = isotropicRatios(POISSONS_RATIO);
    const plate = ritzPlate(space, ratios);
    const measure = measurer(space);
    let shape = settle(plate, new Float64Array(plate.size), loadVector(plate, { mean: 3, halfDifference: 1 })).shape;
    const row = [degree, criticalByBisection(degree, ratios, "bowl")];
    for (const mean of [7.2, 28.7]) {
      shape = settle(plate, shape, loadVector(plate, { mean, halfDifference: 0 })).shape;
      const { bow, centre } = measure(shape);
      row.push(bow.x, centre.y);
    }
    return row.map((value, n) => (n === 0 ? value : Number(value.toFixed(5))));
  });
}

/**
 * Load at which a bowl under equal curvatures, or a saddle under opposite ones, loses its stability: from where its energy no
 * longer has a minimum in the space of `degree`.
 */
export function criticalByBisection(degree: number, ratios: ShearRatios, sort: "bowl" | "saddle"): number {
  const space = ritzSpace("even", degree);
  const plate = ritzPlate(space, ratios);
  const lambda = membraneStiffness(ratios);
  const [tau, bowl] = [ratios.along, sort === "bowl"];
  // Uniform curvature gives the right order of magnitude.
  const uniform = bowl ? Math.sqrt(tau / lambda) * (1 + tau) : (1 + 1 / tau) / Math.sqrt(lambda);
  let [low, high] = [0.5 * uniform, 1.3 * uniform];
  let shape: Float64Array = new Float64Array(plate.size);
  for (let step = 0; step < 32; step += 1) {
    const size = (low + high) / 2;
    const load = bowl ? { mean: size, halfDifference: 0 } : { mean: 0, halfDifference: size };
    const found = settle(plate, shape, loadVector(plate, load));
    // Past the onset the symmetric shape is a ridge.
    if (found.stable && Math.abs(at(found.shape, bowl ? 1 : 0)) < 1e-9)
      [low, shape] = [size, Float64Array.from(found.shape)];
    else high = size;
  }
  return (low + high) / 2;
}
