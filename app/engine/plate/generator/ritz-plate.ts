import { couplings, grams, type Couplings, type Grams } from "./couplings.ts";
import type { ShearRatios } from "../shear-ratios.ts";
import { at, indexAt } from "../table/elements.ts";
import { addSquare, dot, factorise, forward, forwardColumns, backward, multiply } from "./dense.ts";
import {
  deflections,
  profileOf,
  stressFunctions,
  uniformBend,
  type DiscFunction,
  type Parity,
} from "./disc-functions.ts";
import { gaussLegendre } from "./quadrature.ts";

/** Everything of Ritz's method that does not depend on the material. */
export interface RitzSpace {
  degree: number;
  functions: DiscFunction[];
  /** How many of them, the first, are uniform bends. */
  uniform: number;
  stressFunctions: DiscFunction[];
  stressCount: number;
  bending: Grams;
  stress: Grams;
  couplings: Couplings;
}

/**
 * Deflections up to `degree` and stress functions up to the same degree times (1 − r²)², either even in both axes (`even`) or
 * only the same after half a turn (`half-turn`), which lets the shape twist. The factor makes the rim free of forces in the plane;
 * its freedom from moments and shear comes out of the minimum.
 *
 * How it converges, ν = 0.28 (`npm run plate-table` prints it):
 *
 *   degree   S_cr      at 5 S_cr: bow along,  centre across   at 20 S_cr: bow along,  centre across
 *        8   1.43436   8.26621   0.05826    35.15823  -0.43710
 *       12   1.43435   8.26528  -0.08179    35.22221   0.27294
 *       16   1.43435   8.26522  -0.08651    35.22276   0.02418
 *       20   1.43435   8.26523  -0.08606    35.22269  -0.00287
 *       24   1.43435   8.26523  -0.08605    35.22271   0.00044
 *       28   1.43435   8.26523  -0.08605    35.22271   0.00055
 */
export function ritzSpace(symmetry: "even" | "half-turn", degree: number): RitzSpace {
  const parities: Parity[] = symmetry === "even" ? ["even"] : ["even", "twist"];
  const bends = [uniformBend(0, "cos"), uniformBend(2, "cos")];
  if (symmetry === "half-turn") bends.push(uniformBend(2, "sin"));
  const functions = [...bends, ...parities.flatMap((parity) => deflections(parity, degree))];
  const stresses = parities.flatMap((parity) => stressFunctions(parity, degree));
  const { nodes, weights } = radii(degree);
  const profiles = functions.map((one) => profileOf(one, nodes));
  const stressProfiles = stresses.map((one) => profileOf(one, nodes));
  return {
    degree,
    functions,
    uniform: bends.length,
    stressFunctions: stresses,
    stressCount: stresses.length,
    bending: grams(profiles, weights),
    stress: grams(stressProfiles, weights),
    couplings: couplings(stressProfiles, profiles, null, weights),
  };
}

/** Squares of the radii and weights for ∫ … r dr, exact for products of two deflections and a stress function. */
export function radii(degree: number): { nodes: Float64Array; weights: Float64Array } {
  const { nodes, weights } = gaussLegendre(Math.ceil(0.75 * degree) + 6);
  return { nodes, weights: weights.map((weight) => weight / 2) };
}

/** A space with a material. Energies are in units of 16π M h³/12 (h/R)², curvatures in 4h/R². */
export interface RitzPlate {
  space: RitzSpace;
  ratios: ShearRatios;
  size: number;
  /** Bending stiffness. */
  stiffness: Float64Array;
  /** Cholesky factor of the membrane compliance. */
  compliance: Float64Array;
}

const ENERGY = 16 * Math.PI;
/** Membrane against bending stiffness: h against h³/12. */
export const MEMBRANE = 12 / ENERGY;

export function ritzPlate(space: RitzSpace, ratios: ShearRatios): RitzPlate {
  const stiffness = stiffnessOf(space.bending, ratios);
  const compliance = complianceOf(space.stress, ratios, space.stressCount);
  return { space, ratios, size: space.functions.length, stiffness, compliance };
}

/** Bending stiffness of a set of deflections. */
export function stiffnessOf(bending: Grams, { along, between }: ShearRatios): Float64Array {
  return blend(bending, [2 / ENERGY, (along + between) / ENERGY, (along - between) / ENERGY]);
}

/** Cholesky factor of the membrane compliance of a set of stress functions. */
export function complianceOf(stress: Grams, { along, between }: ShearRatios, count: number): Float64Array {
  const compliance = blend(stress, [2, 1 / along + 1 / between, 1 / along - 1 / between]);
  if (!factorise(compliance, count)) throw new RangeError("the membrane compliance is not positive definite");
  return compliance;
}

function blend({ bulk, shear, cubic }: Grams, [a, b, c]: [number, number, number]): Float64Array {
  return bulk.map((value, n) => a * value + b * at(shear, n) + c * at(cubic, n));
}

/** Internal energy at a shape with its derivatives by the coefficients. */
export interface Linearised {
  energy: number;
  gradient: Float64Array;
  /** Both triangles. */
  hessian: Float64Array;
}

/** The membrane strain energy's generalised strains: G_ki = ∂g_k/∂v_i / 2, and g = G v. */
function strains(plate: RitzPlate, shape: Float64Array): { g: Float64Array; matrix: Float64Array } {
  const { space, size, compliance } = plate;
  const { k, i, j, value } = space.couplings;
  const matrix = new Float64Array(space.stressCount * size);
  for (let n = 0; n < value.length; n += 1) {
    const row = indexAt(k, n) * size;
    const [left, right] = [indexAt(i, n), indexAt(j, n)];
    const coupling = at(value, n);
    matrix[row + left] = at(matrix, row + left) + coupling * at(shape, right);
    if (left !== right) matrix[row + right] = at(matrix, row + right) + coupling * at(shape, left);
  }
  forwardColumns(compliance, space.stressCount, matrix, size);
  return { g: multiply(matrix, space.stressCount, shape), matrix };
}

/** Internal energy at a shape. */
export function internalEnergy(plate: RitzPlate, shape: Float64Array): number {
  const { space, stiffness, compliance } = plate;
  const { k, i, j, value } = space.couplings;
  const g = new Float64Array(space.stressCount);
  for (let n = 0; n < value.length; n += 1) {
    const pair = at(shape, indexAt(i, n)) * at(shape, indexAt(j, n)) * (indexAt(i, n) === indexAt(j, n) ? 1 : 2);
    g[indexAt(k, n)] = at(g, indexAt(k, n)) + at(value, n) * pair;
  }
  forward(compliance, space.stressCount, g);
  return dot(shape, multiply(stiffness, plate.size, shape)) / 2 + (MEMBRANE / 2) * dot(g, g);
}

export function linearise(plate: RitzPlate, shape: Float64Array): Linearised {
  const { space, size, stiffness } = plate;
  const { g, matrix } = strains(plate, shape);
  const gradient = multiply(stiffness, size, shape);
  const energy = dot(shape, gradient) / 2 + (MEMBRANE / 2) * dot(g, g);
  const hessian = stiffness.slice();
  for (let n = 0; n < space.stressCount; n += 1) {
    const pull = 2 * MEMBRANE * at(g, n);
    for (let c = 0; c < size; c += 1) gradient[c] = at(gradient, c) + pull * at(matrix, n * size + c);
  }
  addSquare(hessian, size, matrix, space.stressCount, 4 * MEMBRANE);
  const forces = stressOf(plate, g);
  const { k, i, j, value } = space.couplings;
  for (let n = 0; n < value.length; n += 1) {
    const [left, right] = [indexAt(i, n), indexAt(j, n)];
    const share = 2 * MEMBRANE * at(forces, indexAt(k, n)) * at(value, n);
    hessian[left * size + right] = at(hessian, left * size + right) + share;
    if (left !== right) hessian[right * size + left] = at(hessian, right * size + left) + share;
  }
  return { energy, gradient, hessian };
}

/** Coefficients of the stress function, but for the sign. */
function stressOf(plate: RitzPlate, g: Float64Array): Float64Array {
  const forces = g.slice();
  backward(plate.compliance, plate.space.stressCount, forces);
  return forces;
}

/** Coefficients of the stress function at a shape, but for the sign. */
export function stressAt(plate: RitzPlate, shape: Float64Array): Float64Array {
  return stressOf(plate, strains(plate, shape).g);
}
