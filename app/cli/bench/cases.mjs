import { laminateInputNames, laminateInputValues } from "../../engine/uncertainty/laminate-model.ts";

/**
 * Silicon with films of 1 to 3 µm on it.
 *
 * @param {number} count layers in all
 * @param {number} silicon thickness, m
 */
export function stackOf(count, silicon = 725e-6) {
  return Array.from({ length: count }, (_, n) =>
    n === 0
      ? { thickness: silicon, youngsModulus: 130e9, poissonsRatio: 0.2786, cte: "silicon", stress: 0 }
      : {
          thickness: (1 + (n % 3)) * 1e-6,
          youngsModulus: (70 + 5 * (n % 10)) * 1e9,
          poissonsRatio: 0.2,
          stress: (100 - 30 * (n % 10)) * 1e6,
          cte: 2e-6,
        },
  );
}

/**
 * Standard uncertainties of a stack's inputs: 2 % of thickness, 5 % of modulus, 20 MPa of stress; little of the silicon's.
 *
 * @param {ReturnType<typeof stackOf>} layers
 */
export function uncertaintiesOf(layers) {
  return {
    thickness: layers.map(({ thickness }, n) => (n === 0 ? 0.005 : 0.02) * thickness),
    modulus: layers.map(({ youngsModulus }, n) => (n === 0 ? 0.01 : 0.05) * youngsModulus),
    stress: layers.map((_, n) => (n === 0 ? 0.1e6 : 20e6)),
  };
}

/**
 * All inputs of a stack as normal.
 *
 * @param {ReturnType<typeof stackOf>} layers
 */
export function inputsOf(layers) {
  const { thickness, modulus, stress } = uncertaintiesOf(layers);
  const standards = [...thickness, ...modulus, ...stress];
  const values = laminateInputValues(layers);
  return laminateInputNames(layers.length).map((name, n) => ({
    name,
    value: values[n],
    distribution: "normal",
    standard: standards[n],
  }));
}
