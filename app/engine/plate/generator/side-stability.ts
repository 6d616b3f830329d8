import { couplings, grams, type Couplings, type Grams } from "./couplings.ts";
import { at, indexAt } from "../table/elements.ts";
import { addSquare, factorise, forwardColumns } from "./dense.ts";
import { deflections, profileOf, stressFunctions, uniformBend, type Parity } from "./disc-functions.ts";
import { radii, stressAt, stiffnessOf, complianceOf, MEMBRANE, type RitzPlate, type RitzSpace } from "./ritz-plate.ts";

/** Deflections of other symmetry than a space's shapes, and how they couple with them. */
export interface SideSpace {
  count: number;
  stressCount: number;
  bending: Grams;
  stress: Grams;
  /** A stress function of the shapes with two deflections of the side. */
  straining: Couplings;
  /** A stress function of the side with a shape and a deflection of the side. */
  mixing: Couplings;
}

/** Deflections of the given classes beside `space`, whose stress functions and shapes must be those of `ritzSpace`. */
export function sideSpace(space: RitzSpace, parities: readonly Parity[], degree: number): SideSpace {
  const own = parities.flatMap((parity) => [
    ...(parity === "twist" ? [uniformBend(2, "sin")] : []),
    ...deflections(parity, degree),
  ]);
  const { nodes, weights } = radii(Math.max(degree, space.degree));
  const profiles = own.map((one) => profileOf(one, nodes));
  const stresses = parities.flatMap((parity) => stressFunctions(parity, degree)).map((one) => profileOf(one, nodes));
  const shapes = space.functions.map((one) => profileOf(one, nodes));
  const shapeStresses = space.stressFunctions.map((one) => profileOf(one, nodes));
  return {
    count: own.length,
    stressCount: stresses.length,
    bending: grams(profiles, weights),
    stress: grams(stresses, weights),
    straining: couplings(shapeStresses, profiles, null, weights),
    mixing: couplings(stresses, shapes, profiles, weights),
  };
}

/** Stiffness that counts as none, over that of a flat plate: turning a roll on an isotropic plate costs nothing. */
const NEUTRAL = 1e-6;

/** Whether no small change within the side space lowers the energy of a shape in equilibrium. */
export function stableAside(plate: RitzPlate, side: SideSpace, shape: Float64Array): boolean {
  const { count, stressCount, straining, mixing } = side;
  const hessian = stiffnessOf(side.bending, plate.ratios).map((value) => value * (1 + NEUTRAL));
  const compliance = complianceOf(side.stress, plate.ratios, stressCount);
  const matrix = new Float64Array(stressCount * count);
  for (let n = 0; n < mixing.value.length; n += 1) {
    const place = indexAt(mixing.k, n) * count + indexAt(mixing.j, n);
    matrix[place] = at(matrix, place) + at(mixing.value, n) * at(shape, indexAt(mixing.i, n));
  }
  forwardColumns(compliance, stressCount, matrix, count);
  addSquare(hessian, count, matrix, stressCount, 4 * MEMBRANE);
  const forces = stressAt(plate, shape);
  for (let n = 0; n < straining.value.length; n += 1) {
    const [i, j] = [indexAt(straining.i, n), indexAt(straining.j, n)];
    const share = 2 * MEMBRANE * at(forces, indexAt(straining.k, n)) * at(straining.value, n);
    hessian[i * count + j] = at(hessian, i * count + j) + share;
  }
  return factorise(hessian, count);
}
