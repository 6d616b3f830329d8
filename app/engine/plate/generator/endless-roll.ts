import type { ShearRatios } from "../shear-ratios.ts";

/**
 * Where the tables end: a roll whose curvature grows without limit, straight but for a narrow bent rim. The rim is an edge of a
 * cylindrical shell, whose width falls as the square root of the roll's radius: a beam on an elastic foundation at every point
 * of the circle, bent by the moment that the roll leaves over. Own derivation; the solved states tend to it as 1/sqrt(A).
 */
export interface EndlessRoll {
  /** m/s³ of `plate-energy.ts`. */
  stretch: number;
  /** Of every bow and curvature, (value/mean − 1) (1 + R/3)/P: of the mean and of the half difference. */
  mean: number;
  halfDifference: number;
}

const STEPS = 4096;

/** `lambda`: stiffness of the membrane over the biaxial modulus, its compliance averaged over all directions. */
export function endlessRoll({ along, between }: ShearRatios, lambda: number): EndlessRoll {
  let [across, mixed] = [0, 0];
  for (let n = 0; n < STEPS; n += 1) {
    // The rim's normal lies at this angle from the axis that is rolled.
    const angle = (2 * Math.PI * (n + 0.5)) / STEPS;
    const [sine, cosine] = [Math.abs(Math.sin(angle)), Math.cos(angle)];
    const share = Math.cos(2 * angle) ** 2;
    const bending = (1 + along * share + between * (1 - share)) / 2;
    const membrane = 2 / (1 + share / along + (1 - share) / between);
    const slopePerMoment = 1 / (bending ** 0.75 * (3 * membrane) ** 0.25 * sine);
    across += sine ** 4 * slopePerMoment;
    mixed += sine ** 2 * cosine ** 2 * slopePerMoment;
  }
  const integral = (across * 2 * Math.PI) / STEPS;
  const ratio = mixed / across;
  return {
    stretch: (2 * Math.PI) / (lambda * integral * 6 ** 0.75),
    mean: -(1 + ratio) / 6,
    halfDifference: (1 - ratio) / 6,
  };
}
