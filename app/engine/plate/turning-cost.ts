import { siliconPlates } from "./plate.ts";
import type { CurvaturePair } from "./stable-state.ts";
import { locate, type TablePlace } from "./table/coordinates.ts";
import { at } from "./table/elements.ts";
import { evaluateAll, sideBySide, type PlaneSums } from "./table/plane-sum.ts";

const place: TablePlace = { s: 1, x: 1, y: 0, yq: 0, ys: 0, yss: 0, ysq: 0 };
const value = new Float64Array(1);

/** Half difference over mean of the curvatures below which a shape counts as a bowl. */
const NEAR_BOWL = 1e-4;

let apart: PlaneSums | null = null;

/** Energy factor of the hard axes less that of the soft ones. */
function difference(): PlaneSums {
  if (apart === null) {
    const [soft, hard] = [siliconPlates().soft.energy.sum, siliconPlates().hard.energy.sum];
    const coefficients = hard.coefficients.map((one, n) => one - at(soft.coefficients, n));
    apart = sideBySide([{ starts: soft.starts, coefficients }]);
  }
  return apart;
}

/**
 * Energy that a shape of silicon (001) takes up when it turns from <100> to <110> with its mean curvatures held, u_110 − u_100 in
 * the units of `plate-energy.ts`. A bowl has no direction, so it is nothing at B = 0; there the two tables, fitted apart, differ by
 * their errors, which are taken off at every A² + B², fading as the square of q because there are no bowls among long rolls.
 */
export function turningCost({ mean, halfDifference }: CurvaturePair): number {
  // It goes as B² while B is small, where the difference of two energies would be nothing but their rounding.
  const least = NEAR_BOWL * mean;
  if (halfDifference < least) return turningCost({ mean, halfDifference: least }) * (halfDifference / least) ** 2;
  const [soft, hard] = [siliconPlates().soft.energy, siliconPlates().hard.energy];
  const squares = mean * mean + halfDifference * halfDifference;
  const product = (mean - halfDifference) * (mean + halfDifference);
  const bowl = factorAt(squares, 1, soft.rate);
  const q = squares > 0 ? product / squares : 1;
  const apartHere = factorAt(squares, q, soft.rate) - q * q * bowl;
  const stretch = (soft.lambda / 2) * product * product * place.s ** 3 * apartHere;
  return (hard.tau - soft.tau) * halfDifference * halfDifference + stretch;
}

function factorAt(squares: number, q: number, rate: number): number {
  locate(squares, q, rate, place);
  evaluateAll(difference(), place.x, place.y, value);
  return at(value, 0);
}
