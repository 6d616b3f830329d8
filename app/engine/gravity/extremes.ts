/** Lowest and highest value of a smooth function between two ends, by samples and golden section around the best of them. */
export function extremes(f: (r: number) => number, from: number, to: number): { low: number; high: number } {
  const values = Array.from({ length: SAMPLES + 1 }, (_, n) => f(from + ((to - from) * n) / SAMPLES));
  const refined = (sign: 1 | -1) => sign * highest(values, f, sign, from, to);
  return { low: refined(-1), high: refined(1) };
}

const SAMPLES = 24;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Highest value of sign × f. */
function highest(values: readonly number[], f: (r: number) => number, sign: 1 | -1, from: number, to: number): number {
  let [best, most] = [0, -Infinity];
  values.forEach((value, n) => {
    if (sign * value > most) [best, most] = [n, sign * value];
  });
  const at = (n: number) => from + ((to - from) * Math.min(SAMPLES, Math.max(0, n))) / SAMPLES;
  let [low, high] = [at(best - 1), at(best + 1)];
  let [left, right] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
  let [atLeft, atRight] = [sign * f(left), sign * f(right)];
  // The value at an extreme changes with the square of the place: a thousandth of the bracket is 1e-6 of the rise within it.
  for (let n = 0; n < 15; n += 1) {
    if (atLeft > atRight) {
      [high, right, atRight] = [right, left, atLeft];
      left = high - GOLDEN * (high - low);
      atLeft = sign * f(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low + GOLDEN * (high - low);
      atRight = sign * f(right);
    }
  }
  return Math.max(most, atLeft, atRight);
}
