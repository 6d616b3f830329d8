import { requireModulus, requirePoisson, requireThickness, requireWithin } from "../inputs.ts";

/**
 * Curvatures, 1/m, that a thin film of unequal forces per width (N/m, tension positive) gives an isotropic wafer:
 * κ_x = 6 (N_x − ν N_y)/(E h²), κ_y likewise; a bowl is positive, film on the device side. With equal forces it is Stoney's
 * relation. For silicon (001) take E and ν along the film's axes (`siliconDirectionalConstants`).
 *
 * Thin films and small deflections as for `stoneyCurvature`: thick or stiff films need `solveDirectionalLaminate`.
 * Source: Freund and Suresh 2003, chapter 3.
 */
export function directionalStoneyCurvature(i: {
  force: { x: number; y: number };
  substrateThickness: number;
  youngsModulus: number;
  poissonsRatio: number;
}): { x: number; y: number } {
  const x = requireWithin("force.x", i.force.x, -1e9, 1e9, "N/m");
  const y = requireWithin("force.y", i.force.y, -1e9, 1e9, "N/m");
  const thickness = requireThickness("substrateThickness", i.substrateThickness);
  const nu = requirePoisson("poissonsRatio", i.poissonsRatio);
  const scale = 6 / (requireModulus("youngsModulus", i.youngsModulus) * thickness * thickness);
  return { x: scale * (x - nu * y), y: scale * (y - nu * x) };
}
