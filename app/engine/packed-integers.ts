/** Code of the first digit, an opening bracket: 52 characters from there on mean themselves in any string of a program. */
const FIRST = 40;
/** Digits that are followed by another one of the same number; the other 44 end it. */
const LEADING = 8;
const LAST = 44;

/**
 * Integers as text, for tables that a page loads: small ones take one character, and what compresses them further finds the same
 * characters again. A number z (0, −1, 1, −2, 2 … as 0, 1, 2, 3, 4 …) is a bijective numeral of base 8 with a last digit of base 44.
 */
export function packIntegers(values: readonly number[]): string {
  return values.map((value) => digits(value < 0 ? -2 * value - 1 : 2 * value)).join("");
}

function digits(z: number): string {
  let text = String.fromCharCode(FIRST + LEADING + (z % LAST));
  for (let rest = Math.floor(z / LAST); rest > 0; rest = Math.floor((rest - 1) / LEADING))
    text = String.fromCharCode(FIRST + ((rest - 1) % LEADING)) + text;
  return text;
}

/** The integers that `packIntegers` has made text of. */
export function unpackIntegers(text: string): number[] {
  const values: number[] = [];
  let leading = 0;
  for (let n = 0; n < text.length; n += 1) {
    const digit = text.charCodeAt(n) - FIRST;
    if (digit < LEADING) leading = LEADING * leading + digit + 1;
    else {
      const z = LAST * leading + digit - LEADING;
      values.push(z % 2 === 1 ? -(z + 1) / 2 : z / 2);
      leading = 0;
    }
  }
  return values;
}
