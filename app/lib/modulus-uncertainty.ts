/** Relative standard uncertainty of silicon's biaxial modulus (common practice, no source: 0.5 to 1 %). */
export const MODULUS_UNCERTAINTY = 0.01;
