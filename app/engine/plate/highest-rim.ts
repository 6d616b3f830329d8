import { siliconPlates } from "./plate.ts";
import { readingsOf, type Readings } from "./readings.ts";
import type { CurvaturePair } from "./stable-state.ts";
import type { TurnedState } from "./turned-state.ts";

/** Halvings of the search for an angle: to 1e-10 rad. */
const HALVINGS = 32;

/**
 * Readings of a shape of silicon (001) along the axis on which its rim is highest and across it, with the angle from the <110>
 * axis of the load to that axis, rad, 0 to π/4.
 *
 * A crystal's bowl stands higher towards <100>, by k cos 4θ, whatever the load's axes are; under nearly equal loads along <110>
 * the highest point of the rim therefore lies between. With t the angle to the principal axis of the mean curvature and φ the one
 * from there, the rim's height varies as B cos 2φ − k cos 4(t + φ), which is stationary at B sin 2φ = 2 k sin 4(t + φ). In a roll
 * B is so much larger that φ is nothing.
 */
export function readingsAtHighest({ state, turn }: Pick<TurnedState, "state" | "turn">): {
  readings: Readings;
  turn: number;
} {
  const { soft, hard } = siliconPlates();
  const [alongSoft, alongHard] = [readingsOf(soft, state), readingsOf(hard, state)];
  const uplift = (alongSoft.bow.mean - alongHard.bow.mean) / 2;
  const principal = hardShare(turn);
  const spread = mixed(alongSoft.bow.halfDifference, alongHard.bow.halfDifference, principal);
  let [low, high] = uplift > 0 ? [0, Math.PI / 4 - turn] : [-turn, 0];
  for (let n = 0; n < HALVINGS; n += 1) {
    const angle = (low + high) / 2;
    if (2 * uplift * Math.sin(4 * (turn + angle)) > spread * Math.sin(2 * angle)) low = angle;
    else high = angle;
  }
  const aside = uplift > 0 ? low : high;
  const share = hardShare(turn + aside);
  const across = Math.cos(2 * aside);
  const pair = (of: (readings: Readings) => CurvaturePair): CurvaturePair => ({
    mean: mixed(of(alongSoft).mean, of(alongHard).mean, share),
    halfDifference: mixed(of(alongSoft).halfDifference, of(alongHard).halfDifference, principal) * across,
  });
  return {
    readings: {
      bow: pair(({ bow }) => bow),
      centre: pair(({ centre }) => centre),
      parabola: pair(({ parabola }) => parabola),
      rim: mixed(alongSoft.rim, alongHard.rim, principal),
    },
    turn: turn + aside,
  };
}

/** Share of the <110> axis in an axis at an angle from it; the rest is of <100>. */
function hardShare(angle: number): number {
  return Math.cos(2 * angle) ** 2;
}

function mixed(soft: number, hard: number, share: number): number {
  return (1 - share) * soft + share * hard;
}
