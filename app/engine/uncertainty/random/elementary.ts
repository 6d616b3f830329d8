/**
 * Exponential and logarithm by additions, multiplications and divisions alone. Those are correctly rounded everywhere
 * (IEEE 754), while `Math.exp` and `Math.log` may differ in the last digit from one machine to the next: sampling uses these, so
 * that a seed gives the same numbers on every machine.
 */

const LN2_HIGH = 6.9314718036912381649e-1;
const LN2_LOW = 1.90821492927058770002e-10;
const LN2 = 0.6931471805599453;

/** 1/n! for n from 0 to 15, and 1/n for n up to 23. */
const reciprocalFactorials = /* @__PURE__ */ inverseFactorials(16);
const reciprocals = /* @__PURE__ */ Float64Array.from({ length: 24 }, (_, n) => 1 / n);

function inverseFactorials(length: number): Float64Array {
  const inverse = new Float64Array(length).fill(1);
  for (let n = 1; n < length; n += 1) inverse[n] = (inverse[n - 1] ?? 0) / n;
  return inverse;
}

/** e^x within 2e-16 of its size (measured), for x from −700 to 700. Own arrangement: halvings of ln 2, then Taylor's series. */
export function portableExp(x: number): number {
  const power = Math.floor(x / LN2 + 0.5);
  const rest = x - power * LN2_HIGH - power * LN2_LOW;
  let sum = 0;
  for (let n = 15; n >= 2; n -= 1) sum = (sum + (reciprocalFactorials[n] ?? 0)) * rest;
  return scaled(1 + (rest + sum * rest), power);
}

/** ln x within 3e-16 of its size (measured; absolute near 1), for finite x > 0. Own arrangement: atanh of (m − 1)/(m + 1). */
export function portableLog(x: number): number {
  let mantissa = x;
  let power = 0;
  while (mantissa < 1 / 4294967296) {
    mantissa *= 4294967296;
    power -= 32;
  }
  while (mantissa > 4294967296) {
    mantissa /= 4294967296;
    power += 32;
  }
  while (mantissa < Math.SQRT1_2) {
    mantissa *= 2;
    power -= 1;
  }
  while (mantissa > Math.SQRT2) {
    mantissa /= 2;
    power += 1;
  }
  const ratio = (mantissa - 1) / (mantissa + 1);
  const square = ratio * ratio;
  let series = 0;
  for (let n = 23; n >= 3; n -= 2) series = (series + (reciprocals[n] ?? 0)) * square;
  return power * LN2_HIGH + (2 * ratio + (2 * ratio * series + power * LN2_LOW));
}

/** 2^n for n from −NEAR to NEAR. */
const NEAR = 64;
const powers = /* @__PURE__ */ powersOfTwo();

function powersOfTwo(): Float64Array {
  const power = new Float64Array(2 * NEAR + 1).fill(1);
  for (let n = 1; n <= NEAR; n += 1) {
    power[NEAR + n] = 2 * (power[NEAR + n - 1] ?? 0);
    power[NEAR - n] = (power[NEAR - n + 1] ?? 0) / 2;
  }
  return power;
}

/** x 2^power, exact while it stays a normal number. */
function scaled(x: number, power: number): number {
  let result = x;
  let left = power;
  for (; left > NEAR; left -= NEAR) result *= powers[2 * NEAR] ?? 0;
  for (; left < -NEAR; left += NEAR) result *= powers[0] ?? 0;
  return result * (powers[NEAR + left] ?? 0);
}

/** Square root of the sum of squares, in the order given: `Math.hypot` is not the same everywhere. */
export function rootSumOfSquares(values: Float64Array | readonly number[]): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return Math.sqrt(sum);
}
