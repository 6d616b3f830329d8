/** Most terms of the continued fraction: it needs about the square root of the larger argument, here up to 1e7. */
const MOST_TERMS = 20000;
const TINY = 1e-300;

/**
 * Regularised incomplete beta function I_x(a, b) for a, b > 0, by its continued fraction (modified Lentz); 0 below x = 0, 1 above x = 1.
 * Source: Abramowitz and Stegun 1964, 26.5.8; Press and others 1992, section 6.4, both from memory.
 */
export function incompleteBeta(a: number, b: number, x: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  const front = Math.exp(a * Math.log(x) + b * Math.log1p(-x) + logGamma(a + b) - logGamma(a) - logGamma(b));
  return x < (a + 1) / (a + b + 2) ? (front * fraction(a, b, x)) / a : 1 - (front * fraction(b, a, 1 - x)) / b;
}

function fraction(a: number, b: number, x: number): number {
  const safe = (value: number) => (Math.abs(value) < TINY ? TINY : value);
  let c = 1;
  let d = 1 / safe(1 - ((a + b) * x) / (a + 1));
  let sum = d;
  for (let m = 1; m <= MOST_TERMS; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / safe(1 + even * d);
    c = safe(1 + even / c);
    sum *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / safe(1 + odd * d);
    c = safe(1 + odd / c);
    sum *= d * c;
    if (Math.abs(d * c - 1) < 1e-15) break;
  }
  return sum;
}

/** Coefficients of Stirling's series, 1/12, −1/360, … */
const STIRLING = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188] as const;

/** ln Γ(x) for x > 0 by Stirling's series, from x + 8 down. */
function logGamma(x: number): number {
  let shifted = x;
  let product = 1;
  while (shifted < 10) {
    product *= shifted;
    shifted += 1;
  }
  const inverse = 1 / (shifted * shifted);
  let series = 0;
  for (let n = STIRLING.length - 1; n >= 0; n -= 1) series = series * inverse + (STIRLING[n] ?? 0);
  return (
    (shifted - 0.5) * Math.log(shifted) - shifted + Math.log(2 * Math.PI) / 2 + series / shifted - Math.log(product)
  );
}
